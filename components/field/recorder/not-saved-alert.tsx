'use client';

import type { ReactElement } from 'react';
import { FieldButton } from '@/components/field/parts/field-button';
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
      <p className="mt-1 leading-snug">{unsavedReason(first)} Until then, keep this page open.</p>
      <div className="mt-3 flex flex-wrap gap-gap">
        <FieldButton tone="main" onClick={() => recorder.retryUnsaved()}>
          Try again
        </FieldButton>
        <CopyUnsentKey>Make a copy</CopyUnsentKey>
      </div>
    </section>
  );
}
