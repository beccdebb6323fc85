'use client';

import type { ReactElement } from 'react';
import { FieldButton } from '@/components/field/parts/field-button';
import { Sheet } from '@/components/field/parts/sheet';
import { cellTitle } from '@/components/field/words/cell-words';
import { changeWords, SURPRISE_WORDS } from '@/components/field/words/surprise-words';
import type { CellChange, Surprise } from '@/lib/brood/surprising-change';
import type { Axial } from '@/lib/comb/axial';
import { STATE_WORDS } from '@/lib/comb/states';
import type { Recorder } from '@/lib/offline/recorder-view';
import { markUnsure } from './recorder-acts';

/** A mark that is already kept, and what is surprising about it. */
export interface Surprising {
  cell: Axial;
  change: CellChange;
  surprise: Surprise;
}

interface SurpriseSheetProps {
  recorder: Recorder;
  surprising: Surprising | null;
  onClose: () => void;
}

function SurpriseBody({ recorder, surprising, onClose }: SurpriseSheetProps & { surprising: Surprising }) {
  const { cell, change, surprise } = surprising;
  const then = (act?: () => void) => () => {
    act?.();
    onClose();
  };
  return (
    <div className="flex flex-col gap-gap">
      <p>
        <strong>{changeWords(change)}</strong> {SURPRISE_WORDS[surprise]} Look once more. Your mark is kept whatever you
        answer.
      </p>
      <FieldButton tone="main" onClick={then()}>
        Yes, {STATE_WORDS[change.to]}
      </FieldButton>
      <FieldButton onClick={then(() => markUnsure(recorder, cell))}>
        {STATE_WORDS[change.to].replace(/^./, (letter) => letter.toUpperCase())}, but unsure
      </FieldButton>
      <FieldButton onClick={then(() => recorder.undo())}>Take the mark back</FieldButton>
    </div>
  );
}

/** Asks about a mark that hardly fits what was seen at the last visit. The mark is kept before anybody is asked. */
export function SurpriseSheet(props: SurpriseSheetProps): ReactElement {
  const { surprising, onClose } = props;
  return (
    <Sheet open={surprising !== null} title={`${cellTitle(surprising?.cell ?? null)}: is that so?`} onClose={onClose}>
      {surprising && <SurpriseBody {...props} surprising={surprising} />}
    </Sheet>
  );
}
