'use client';

import { type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/input';
import { Notice } from '@/components/ui/notice';
import { reasonTrouble } from './correction';
import { useChange } from './use-change';

interface LockActsProps {
  nest: string;
  reading: string;
  /** The locked version now in force, or null while the reading can be settled. */
  lockedVersion: number | null;
  /** Decisions in the list that are not stored; locking waits for them. */
  unsaved: number;
}

/** Asks once more, then locks: from there on only a new version with a reason changes anything. */
function LockQuestion({ nest, reading, unsaved }: Omit<LockActsProps, 'lockedVersion'>): ReactElement {
  const [isOpen, setOpen] = useState(false);
  const { send, isSending, trouble } = useChange({ nest, reading, onStored: () => setOpen(false) });
  return (
    <>
      <Button onClick={() => setOpen(true)} disabled={unsaved > 0}>
        Lock the reading
      </Button>
      {unsaved > 0 && <p className="mt-1 text-sm text-quiet">Settle the list or take it out before locking.</p>}
      <Dialog open={isOpen} onClose={() => setOpen(false)} title="Lock this reading?">
        <p>
          Its version is then fixed and goes into letters and downloads. It can only be amended, with a reason; every
          version is kept.
        </p>
        {trouble && (
          <Notice tone="stop" live="assertive" className="mt-3">
            <p>{trouble}</p>
          </Notice>
        )}
        <div className="mt-5 flex flex-wrap gap-3">
          <Button tone="main" disabled={isSending} onClick={() => send({ act: 'lock', body: {} })}>
            {isSending ? 'Locking …' : 'Lock it'}
          </Button>
          <Button onClick={() => setOpen(false)}>Not yet</Button>
        </div>
      </Dialog>
    </>
  );
}

/** Opens a locked reading as a new version, with the reason that every reader of the history sees. */
function AmendQuestion({ nest, reading, lockedVersion }: Omit<LockActsProps, 'unsaved'>): ReactElement {
  const [isOpen, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const [wrong, setWrong] = useState<string | null>(null);
  const { send, isSending, trouble } = useChange({ nest, reading, onStored: () => setOpen(false) });
  const amend = (): void => {
    const problem = reasonTrouble(reason);
    setWrong(problem);
    if (problem === null) send({ act: 'amend', body: { reason: reason.trim() } });
  };
  return (
    <>
      <Button onClick={() => setOpen(true)}>Amend</Button>
      <Dialog open={isOpen} onClose={() => setOpen(false)} title={`Amend version ${lockedVersion ?? ''}`}>
        <Field id="amend-reason" label="Reason" hint="Kept with the new version." error={wrong ?? trouble}>
          {(control) => <TextArea {...control} value={reason} onChange={(event) => setReason(event.target.value)} />}
        </Field>
        <div className="mt-5 flex flex-wrap gap-3">
          <Button tone="main" disabled={isSending} onClick={amend}>
            {isSending ? 'Opening …' : 'Open a new version'}
          </Button>
          <Button onClick={() => setOpen(false)}>Leave it locked</Button>
        </div>
      </Dialog>
    </>
  );
}

/** Lock while it is open, amend once it is locked. */
export function LockActs({ lockedVersion, unsaved, ...rest }: LockActsProps): ReactElement {
  return lockedVersion === null ? (
    <LockQuestion unsaved={unsaved} {...rest} />
  ) : (
    <AmendQuestion lockedVersion={lockedVersion} {...rest} />
  );
}
