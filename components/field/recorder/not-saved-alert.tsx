'use client';

import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { CopyUnsentKey } from '@/components/field/unsent/copy-unsent-key';
import { unsavedReason, unsavedWords } from '@/components/field/words/cell-words';
import type { Recorder } from '@/lib/offline/recorder-view';

/** Says in red which presses the phone could not keep, and offers to try again or to make a copy. */
export function NotSavedAlert({ recorder }: { recorder: Recorder }): ReactElement | null {
  const { unsaved } = recorder.view;
  const [first] = unsaved;
  if (!first) return null;
  return (
    <section role="alert" className="rounded-xl border-3 border-stop bg-stop-wash p-4">
      <h2 className="text-xl font-bold text-stop">
        {unsaved.map((press) => (
          <span key={press.opId} className="block">
            Not saved: {unsavedWords(press)}
          </span>
        ))}
      </h2>
      <p className="mt-1">{unsavedReason(first)} Keep this page open: what is not saved is held here only.</p>
      <div className="mt-3 flex flex-wrap gap-gap">
        <Button tone="main" size="field" onClick={() => recorder.retryUnsaved()}>
          Try again
        </Button>
        <CopyUnsentKey />
      </div>
    </section>
  );
}
