'use client';

import type { ReactElement } from 'react';
import { type Desk, pressNoCell } from './desk';

/** What undo would bring back, in words, with its key; and the key for a place where the comb has no cell. */
export function UndoRow({ desk }: { desk: Desk }): ReactElement {
  const { recorder, mode } = desk;
  const { undoWords } = recorder.view;
  const mayBeNoCell = mode.kind === 'walk' && recorder.view.current !== null;
  return (
    <>
      <div className="hand-mirror col-span-2 flex min-h-field items-stretch gap-[3px] overflow-hidden rounded-xl border-3 border-ink bg-ink">
        <p id="undo-words" className="flex min-w-0 flex-1 items-center bg-paper px-3 leading-tight">
          {undoWords ?? 'Nothing to undo'}
        </p>
        <button
          type="button"
          aria-describedby="undo-words"
          aria-disabled={undoWords === null}
          onClick={() => undoWords !== null && recorder.undo()}
          className="min-h-field min-w-22 touch-manipulation bg-paper px-3 text-xl font-bold select-none active:bg-main-wash aria-disabled:text-quiet"
        >
          Undo
        </button>
      </div>
      <button
        type="button"
        aria-disabled={!mayBeNoCell}
        onClick={() => pressNoCell(desk)}
        className="min-h-field min-w-0 touch-manipulation rounded-xl border-3 border-ink bg-paper px-2 leading-tight font-bold select-none active:bg-main-wash aria-disabled:border-rule aria-disabled:text-quiet"
      >
        No cell here
      </button>
    </>
  );
}
