import type { ReactElement } from 'react';
import { CELL_STATES, type CellState, STATE_WORDS } from '@/lib/comb/states';
import { CellGlyph, MarkGlyph } from './cell-glyph';
import type { CombCellView } from './comb-view';

const MARK_WORDS = {
  nectar: 'nectar',
  unsure: 'unsure',
  reused: 'reused',
  scrap: 'prey scrap',
  noted: 'note',
  changed: 'settled by a reviewer',
} as const;

type MarkName = keyof typeof MARK_WORDS;

const MARK_NAMES: readonly MarkName[] = ['nectar', 'unsure', 'reused', 'scrap', 'noted', 'changed'];

interface CombKeyProps {
  /** Explain only what these cells show; all twelve states and six marks when left out. */
  cells?: readonly CombCellView[];
  className?: string;
}

/** Says what each symbol means, in the order of the states: for screens and for print. */
export function CombKey({ cells, className = '' }: CombKeyProps): ReactElement {
  const shows = (state: CellState): boolean => !cells || cells.some((cell) => cell.state === state);
  const bears = (mark: MarkName): boolean => !cells || cells.some((cell) => cell[mark] === true);
  return (
    <ul aria-label="What the symbols mean" className={`comb-key ${className}`}>
      {CELL_STATES.filter(shows).map((state) => (
        <li key={state} className="flex items-center gap-1.5">
          <CellGlyph state={state} size={26} />
          {STATE_WORDS[state]}
        </li>
      ))}
      {MARK_NAMES.filter(bears).map((mark) => (
        <li key={mark} className="flex items-center gap-1.5">
          <MarkGlyph mark={mark} size={22} />
          {MARK_WORDS[mark]}
        </li>
      ))}
    </ul>
  );
}
