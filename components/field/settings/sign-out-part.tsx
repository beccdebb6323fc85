'use client';

import { type ReactElement, useState } from 'react';
import { countWords } from '@/components/ui/date-words';
import { Disclosure } from '@/components/ui/disclosure';
import { Notice } from '@/components/ui/notice';
import { FieldButton } from '@/components/field/parts/field-button';
import { Part } from '@/components/field/parts/part';
import { CopyUnsentKey } from '@/components/field/unsent/copy-unsent-key';
import { type Outbox, useOutbox } from '@/lib/offline/hooks/use-outbox';
import { useSession } from '@/lib/offline/hooks/use-session';
import { DeleteHere } from './delete-here';

/** Everything that has not arrived: unsent or held up. It stays on the phone when its person leaves. */
function openItems({ waiting, attention }: Outbox): number {
  return waiting + attention.filter((item) => item.why !== 'set-aside').length;
}

/** Presses that only this open page holds: leaving would lose them, so there is no way out but to save them first. */
function NotNow({ unsaved }: { unsaved: number }): ReactElement {
  return (
    <>
      <Notice tone="stop" title={`Not now: ${countWords(unsaved, 'press', 'presses')} not saved`}>
        <p>Go back to the reading and try again, or make a copy. Signing out now would lose them.</p>
      </Notice>
      <CopyUnsentKey>Copy of everything unsent</CopyUnsentKey>
    </>
  );
}

/** The key that leaves. A failure leaves everything as it was. */
function SignOutKey({ children }: { children: string }): ReactElement {
  const { signOut } = useSession();
  const [state, setState] = useState<'ready' | 'leaving' | 'failed'>('ready');
  const leave = async (): Promise<void> => {
    setState('leaving');
    try {
      await signOut();
    } catch {
      setState('failed');
    }
  };
  return (
    <>
      {state === 'failed' && (
        <Notice tone="warn" live="assertive" title="Still signed in">
          <p>That did not work. Nothing is lost. Try again.</p>
        </Notice>
      )}
      <FieldButton tone="stop" onClick={() => void leave()} disabled={state === 'leaving'}>
        {state === 'leaving' ? 'Signing out …' : children}
      </FieldButton>
    </>
  );
}

/** The three ways out with unsent work, those that delete nothing first. */
function ThreeWays({ outbox }: { outbox: Outbox }): ReactElement {
  return (
    <>
      <Notice tone="warn" title={`Still on this phone: ${countWords(openItems(outbox), 'item')}`}>
        <p>Send first where there is signal. Without signal, keep them here.</p>
      </Notice>
      <FieldButton tone="main" onClick={outbox.sendNow} disabled={outbox.busy}>
        {outbox.busy ? 'Sending …' : 'Send now'}
      </FieldButton>
      <div className="flex flex-col gap-2">
        <SignOutKey>Sign out and keep them here</SignOutKey>
        <p className="text-quiet">
          They stay closed on this phone. Whoever signs in next sees nothing of them; they go when you sign in here
          again.
        </p>
      </div>
      <Disclosure size="field" summary="Make a copy, then delete them here">
        <DeleteHere outbox={outbox} />
      </Disclosure>
    </>
  );
}

function WaysOut({ outbox }: { outbox: Outbox }): ReactElement {
  if (outbox.unsaved > 0) return <NotNow unsaved={outbox.unsaved} />;
  if (openItems(outbox) === 0) return <SignOutKey>Sign out</SignOutKey>;
  return <ThreeWays outbox={outbox} />;
}

/** The way out: open when everything has arrived, three ways when something is unsent, shut when it would lose work. */
export function SignOutPart(): ReactElement {
  const outbox = useOutbox();
  return <Part title="Sign out">{outbox ? <WaysOut outbox={outbox} /> : <p>Looking for unsent work …</p>}</Part>;
}
