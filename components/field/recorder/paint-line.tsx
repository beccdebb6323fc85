'use client';

import type { ReactElement } from 'react';
import { CellGlyph } from '@/components/comb/cell-glyph';
import { STATE_WORDS } from '@/lib/comb/states';
import type { Desk, Mode } from './desk';

interface PaintLineProps {
  desk: Desk;
  mode: Extract<Mode, { kind: 'paint' }>;
}

/** Stands where the current cell is named in the walk: nobody can miss that taps paint now. */
export function PaintLine({ desk, mode }: PaintLineProps): ReactElement {
  return (
    <div className="flex min-h-19 items-center gap-3 rounded-xl bg-main px-3 text-main-on">
      <CellGlyph state={mode.state} size={48} />
      <p className="min-w-0 flex-1 leading-tight">
        Paint, tap cells:
        <span className="block text-2xl font-bold">{STATE_WORDS[mode.state]}</span>
      </p>
      <button
        type="button"
        onClick={() => desk.setMode({ kind: 'walk' })}
        className="min-h-field w-24 shrink-0 touch-manipulation rounded-xl border-3 border-main-on px-2 leading-tight font-bold"
      >
        Stop painting
      </button>
    </div>
  );
}
