'use client';

import type { ReactElement } from 'react';
import { Notice } from '@/components/ui/notice';
import { FieldButton } from '@/components/field/parts/field-button';
import { Screen } from '@/components/field/parts/screen';
import { CopyUnsentKey } from '@/components/field/unsent/copy-unsent-key';
import { useActivity } from '@/lib/offline/hooks/use-activity';
import { useStanding } from '@/lib/offline/hooks/use-standing';

/** Instead of the app, while a tab with an older version holds the records. It goes on by itself. */
export function OtherTabFirst(): ReactElement {
  return (
    <div className="min-h-dvh bg-paper text-field text-ink">
      <Screen title="Close the other tab">
        <Notice tone="warn" live="polite" title="An older version of Undereave is open in another tab">
          <p>
            Finish there what you are doing and close that tab. This one goes on by itself. Everything saved on this
            phone stays.
          </p>
        </Notice>
      </Screen>
    </div>
  );
}

/** A newer version in another tab has taken the records over: nothing entered here is kept until this page is loaded anew. */
export function TakenOverNotice(): ReactElement | null {
  const { tab } = useStanding();
  const { notSaved } = useActivity();
  if (tab !== 'taken-over') return null;
  return (
    <section
      aria-label="Other tab"
      className="print-hidden border-b-2 border-stop bg-stop-wash px-gap py-4 text-field text-ink"
    >
      <p role="alert" className="font-bold">
        A newer version works in another tab. This one keeps nothing any more.
      </p>
      <p>Everything that was shown as saved is saved.</p>
      <div className="mt-3 flex flex-wrap gap-gap">
        {notSaved > 0 && <CopyUnsentKey>Copy what is not saved</CopyUnsentKey>}
        <FieldButton tone="main" onClick={() => window.location.reload()}>
          Load this page anew
        </FieldButton>
      </div>
    </section>
  );
}
