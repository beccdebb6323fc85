'use client';

import type { ReactElement } from 'react';
import { cellLine, cellTitle } from '@/components/field/words/cell-words';
import { progressWords } from '@/components/field/words/reading-words';
import { type Desk, stepTo } from './desk';

/** The walk's keys for one cell back and forward. */
const STEPS = {
  back: { key: 'PageUp', shift: false },
  forward: { key: 'PageDown', shift: false },
} as const;

interface StepKeyProps {
  desk: Desk;
  way: keyof typeof STEPS;
}

function StepKey({ desk, way }: StepKeyProps): ReactElement {
  const to = stepTo(desk.recorder.view, STEPS[way]);
  return (
    <button
      type="button"
      aria-label={way === 'back' ? 'One cell back' : 'One cell forward'}
      aria-disabled={to === null}
      onClick={() => to && desk.recorder.jump(to)}
      className="min-h-16 min-w-16 shrink-0 touch-manipulation rounded-xl border-3 border-ink bg-paper text-3xl font-bold select-none active:bg-main-wash aria-disabled:border-rule aria-disabled:text-quiet"
    >
      <span aria-hidden="true">{way === 'back' ? '‹' : '›'}</span>
    </button>
  );
}

/** The current cell in large, how far the walk is, and the keys for one cell back and forward. */
export function CellLine({ desk }: { desk: Desk }): ReactElement {
  const { view } = desk.recorder;
  return (
    <div className="flex items-center gap-3">
      <StepKey desk={desk} way="back" />
      <div className="min-w-0 flex-1 text-center leading-tight">
        <p className="text-number font-bold">{cellTitle(view.current)}</p>
        <p className="min-h-6 truncate">{view.current ? cellLine(view) : 'Press Finish, or a place on the comb.'}</p>
      </div>
      <StepKey desk={desk} way="forward" />
    </div>
  );
}

/** A still bar that grows by one piece a cell. Shown only when the person counted the cells. */
export function WalkProgress({ desk }: { desk: Desk }): ReactElement {
  const { tally, expectedTotal } = desk.recorder.view;
  const share = expectedTotal === null ? 0 : Math.min(1, tally.cellsTotal / expectedTotal);
  return (
    <div className="flex items-center gap-3">
      <div aria-hidden="true" className="h-2.5 flex-1 bg-rule">
        <div className="h-full bg-main" style={{ width: `${share * 100}%` }} />
      </div>
      <p className="font-bold tabular-nums">{progressWords(tally.cellsTotal, expectedTotal)}</p>
    </div>
  );
}
