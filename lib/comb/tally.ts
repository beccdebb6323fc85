import type { MarkContent } from './mark';
import type { CellState } from './states';

/** Counts by state of one reading; the twelve states sum to `cellsTotal`, nectar is counted apart. */
export interface Tally extends Record<CellState, number> {
  cellsTotal: number;
  nectarCells: number;
}

/** A tally of nothing. */
export function emptyTally(): Tally {
  return {
    cellsTotal: 0,
    empty: 0,
    egg: 0,
    small: 0,
    medium: 0,
    large: 0,
    capped: 0,
    opened: 0,
    dead: 0,
    parasitised: 0,
    webbed: 0,
    damaged: 0,
    unread: 0,
    nectarCells: 0,
  };
}

/** Counts the live cells of a reading by state. */
export function tallyOf(cells: readonly Pick<MarkContent, 'state' | 'nectar'>[]): Tally {
  const tally = emptyTally();
  for (const cell of cells) {
    tally.cellsTotal += 1;
    tally[cell.state] += 1;
    if (cell.nectar) tally.nectarCells += 1;
  }
  return tally;
}
