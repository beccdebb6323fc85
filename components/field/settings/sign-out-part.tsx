'use client';

import { type ReactElement, useState } from 'react';
import { countWords } from '@/components/ui/date-words';
import { Notice } from '@/components/ui/notice';
import { FieldButton } from '@/components/field/parts/field-button';
import { Part } from '@/components/field/parts/part';
import { CopyUnsentKey } from '@/components/field/unsent/copy-unsent-key';
import { type Outbox, useOutbox } from '@/lib/offline/hooks/use-outbox';
import { useSession } from '@/lib/offline/hooks/use-session';

/** Everything that would be at risk if this phone changed hands: unsent, held up, or not even saved. */
function openItems(outbox: Outbox): number {
  return outbox.waiting + outbox.unsaved + outbox.attention.filter((item) => item.why !== 'set-aside').length;
}

/** Shown in place of the key while something is unsent: signing out could leave it behind. */
function NotYet({ outbox }: { outbox: Outbox }): ReactElement {
  return (
    <>
      <Notice tone="warn" title={`Not yet: ${countWords(openItems(outbox), 'item')} unsent`}>
        <p>
          Send first. Signing out now could leave this work behind on the phone, where the next person cannot send it.
        </p>
      </Notice>
      <div className="flex flex-wrap items-start gap-gap">
        <FieldButton tone="main" onClick={outbox.sendNow} disabled={outbox.busy}>
          {outbox.busy ? 'Sending …' : 'Send now'}
        </FieldButton>
        <CopyUnsentKey>Copy of everything unsent</CopyUnsentKey>
      </div>
    </>
  );
}

function SignOutKey(): ReactElement {
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
      <p>Everything of yours is at the office.</p>
      {state === 'failed' && (
        <Notice tone="warn" live="assertive" title="Still signed in">
          <p>The office did not answer. Try again where there is signal.</p>
        </Notice>
      )}
      <FieldButton tone="stop" onClick={() => void leave()} disabled={state === 'leaving'}>
        {state === 'leaving' ? 'Signing out …' : 'Sign out'}
      </FieldButton>
    </>
  );
}

/** The way out. It stays shut while something is unsent, and says what to do. */
export function SignOutPart(): ReactElement {
  const outbox = useOutbox();
  return (
    <Part title="Sign out">
      {outbox === undefined && <p>Looking for unsent work …</p>}
      {outbox && (openItems(outbox) > 0 ? <NotYet outbox={outbox} /> : <SignOutKey />)}
    </Part>
  );
}
