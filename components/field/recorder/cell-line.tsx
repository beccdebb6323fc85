'use client';

import type { ReactElement } from 'react';
import { cellLine, cellTitle } from '@/components/field/words/cell-words';
import { besideInWalk, type Desk } from './desk';

interface StepKeyProps {
  desk: Desk;
  way: 'back' | 'forward';
}

function StepKey({ desk, way }: StepKeyProps): ReactElement {
  const to = besideInWalk(desk.recorder.view, way === 'back' ? -1 : 1);
  return (
    <button
      type="button"
      aria-label={way === 'back' ? 'One cell back' : 'One cell forward'}
      aria-disabled={to === null}
      onClick={() => to && desk.recorder.jump(to)}
      className="min-h-16 min-w-[min(4rem,max(64px,17vw))] shrink-0 touch-manipulation rounded-xl border-3 border-ink bg-paper text-3xl font-bold select-none active:bg-main-wash aria-disabled:border-rule aria-disabled:text-quiet"
    >
      <span aria-hidden="true">{way === 'back' ? '‹' : '›'}</span>
    </button>
  );
}

/** How far the walk is, drawn: it grows by one piece a cell. Bare when nobody counted the cells. */
function WalkBar({ desk }: { desk: Desk }): ReactElement {
  const { tally, expectedTotal } = desk.recorder.view;
  const share = expectedTotal === null ? 0 : Math.min(1, tally.cellsTotal / expectedTotal);
  return (
    <div aria-hidden="true" className="h-2 bg-rule">
      <div className="h-full bg-main" style={{ width: `${share * 100}%` }} />
    </div>
  );
}

/** The current cell in large with the keys for one cell back and forward, and how far the walk is. */
export function CellLine({ desk }: { desk: Desk }): ReactElement {
  const { view } = desk.recorder;
  return (
    <div className="flex flex-col gap-2">
      <div className="flex items-center gap-3">
        <StepKey desk={desk} way="back" />
        <div className="min-w-0 flex-1 text-center leading-tight">
          <p className="text-number font-bold">{cellTitle(view.current)}</p>
          <p className="truncate">{cellLine(view)}</p>
        </div>
        <StepKey desk={desk} way="forward" />
      </div>
      <WalkBar desk={desk} />
    </div>
  );
}
