import type { ReactElement } from 'react';
import type { CellState } from '@/lib/comb/states';
import { MARK_SYMBOLS, STATE_SYMBOLS } from './comb-symbols';

interface CellGlyphProps {
  state: CellState;
  /** Edge of the square it is drawn in, in CSS pixels. */
  size?: number;
}

/** One state as a small hexagon, for keys, tables and legends. The word beside it carries the meaning. */
export function CellGlyph({ state, size = 28 }: CellGlyphProps): ReactElement {
  return (
    <svg
      className={`comb-cell cell-${state} inline-block shrink-0`}
      width={size}
      height={size}
      viewBox="0 0 48 48"
      aria-hidden="true"
    >
      <use href={`#${STATE_SYMBOLS[state]}`} />
    </svg>
  );
}

interface MarkGlyphProps {
  mark: keyof typeof MARK_SYMBOLS;
  size?: number;
}

const MARK_VIEW: Readonly<Record<keyof typeof MARK_SYMBOLS, string>> = {
  nectar: '25 4 18 18',
  unsure: '5.5 5.5 18 18',
  reused: '24 23 18 18',
  scrap: '27.5 25.5 18 18',
  noted: '5.3 25.1 18 18',
  changed: '24.2 25 18 18',
};

/** One of the small marks alone, cropped to its corner. */
export function MarkGlyph({ mark, size = 24 }: MarkGlyphProps): ReactElement {
  return (
    <svg
      className="comb-mark inline-block shrink-0"
      width={size}
      height={size}
      viewBox={MARK_VIEW[mark]}
      aria-hidden="true"
    >
      <use href={`#${MARK_SYMBOLS[mark]}`} width="48" height="48" />
    </svg>
  );
}
