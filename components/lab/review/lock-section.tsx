'use client';

import { type ReactElement, useState } from 'react';
import { reasonTrouble } from '@/components/lab/bench/correction';
import { Button } from '@/components/ui/button';
import { countWords } from '@/components/ui/date-words';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/input';
import { Notice } from '@/components/ui/notice';
import type { FinalStandingView } from './review-shapes';
import { type ActHandle, useAct } from './use-act';

interface LockSectionProps {
  reading: string;
  final: FinalStandingView | null;
  /** Cells both readers saw alike; null without a second reading. */
  alike: number | null;
  /** Cells still to be decided. */
  open: number;
}

function Trouble({ act }: { act: ActHandle }): ReactElement | null {
  if (!act.trouble) return null;
  return (
    <Notice tone="stop" live="assertive" className="mt-2">
      <p>{act.trouble}</p>
    </Notice>
  );
}

/** Accepts at once what both readers saw alike; never what they differ on. */
function AcceptAlike({ reading, alike }: { reading: string; alike: number }): ReactElement {
  const act = useAct(`/api/readings/${reading}/accept`);
  return (
    <div>
      <Button onClick={() => act.send({})} disabled={act.isSending}>
        Accept the {countWords(alike, 'cell')} read alike
      </Button>
      <p className="mt-1 text-sm text-quiet">
        Makes the final reading from the field reading. Cells the readers differ on are settled one by one.
      </p>
      <Trouble act={act} />
    </div>
  );
}

function LockKey({ reading, open }: { reading: string; open: number }): ReactElement {
  const act = useAct(`/api/readings/${reading}/lock`);
  return (
    <div>
      <Button tone="main" onClick={() => act.send({})} disabled={open > 0 || act.isSending}>
        {act.isSending ? 'Locking …' : 'Lock the final reading'}
      </Button>
      <p className="mt-1 text-sm text-quiet">
        {open > 0
          ? `${countWords(open, 'cell')} to settle before it can be locked.`
          : 'Fixes this version with the names, the settings and a hash. Only an amendment can follow.'}
      </p>
      <Trouble act={act} />
    </div>
  );
}

function AmendKey({ reading, version }: { reading: string; version: number }): ReactElement {
  const [isOpen, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const [wrong, setWrong] = useState<string | null>(null);
  const act = useAct(`/api/readings/${reading}/amend`, { done: () => setOpen(false) });
  const amend = (): void => {
    const problem = reasonTrouble(reason);
    setWrong(problem);
    if (problem === null) act.send({ reason: reason.trim() });
  };
  return (
    <>
      <Button onClick={() => setOpen(true)}>Amend version {version}</Button>
      <Dialog open={isOpen} onClose={() => setOpen(false)} title={`Amend version ${version}`}>
        <Field id="review-amend" label="Reason" hint="Kept with the new version." error={wrong ?? act.trouble}>
          {(control) => <TextArea {...control} value={reason} onChange={(event) => setReason(event.target.value)} />}
        </Field>
        <div className="mt-5 flex flex-wrap gap-3">
          <Button tone="main" disabled={act.isSending} onClick={amend}>
            Open version {version + 1}
          </Button>
          <Button onClick={() => setOpen(false)}>Leave it locked</Button>
        </div>
      </Dialog>
    </>
  );
}

/** The end of the review: accept, lock, and later amend. */
export function LockSection({ reading, final, alike, open }: LockSectionProps): ReactElement {
  const isLocked = final !== null && final.lockedVersion === final.version;
  if (isLocked) return <AmendKey reading={reading} version={final.version} />;
  return (
    <div className="flex flex-col gap-4">
      {final === null && alike !== null && alike > 0 && <AcceptAlike reading={reading} alike={alike} />}
      <LockKey reading={reading} open={open} />
    </div>
  );
}
