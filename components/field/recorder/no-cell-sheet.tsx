'use client';

import type { ReactElement } from 'react';
import { FieldButton } from '@/components/field/parts/field-button';
import { Sheet } from '@/components/field/parts/sheet';
import { cellTitle, markWords } from '@/components/field/words/cell-words';
import type { Recorder } from '@/lib/offline/recorder-view';
import { currentMark } from './recorder-acts';

interface NoCellSheetProps {
  recorder: Recorder;
  open: boolean;
  onClose: () => void;
}

/** Asks before a cell that bears a mark is taken off the comb. */
export function NoCellSheet({ recorder, open, onClose }: NoCellSheetProps): ReactElement {
  const mark = currentMark(recorder.view);
  const takeOff = (): void => {
    recorder.skip();
    onClose();
  };
  return (
    <Sheet open={open} title={`No ${cellTitle(recorder.view.current).toLowerCase()}?`} onClose={onClose}>
      <div className="flex flex-col gap-gap">
        <p>
          It bears the mark <strong>{mark ? markWords(mark) : 'unread'}</strong>. Without the cell its marks go too, and
          undo does not bring them back.
        </p>
        <FieldButton tone="stop" onClick={takeOff}>
          Take it off the comb
        </FieldButton>
        <FieldButton onClick={onClose}>Keep it</FieldButton>
      </div>
    </Sheet>
  );
}
