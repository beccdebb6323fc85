import { cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import type { BroodReading } from './input';

/** One time somebody looked into a cell. */
export interface CellLook {
  /** Epoch milliseconds. */
  at: number;
  state: CellState;
}

/** States that say nobody could look in. */
const NOT_LOOKED_AT: ReadonlySet<CellState> = new Set(['unread', 'webbed', 'damaged']);

/** What was seen in each cell, by `cellKey`, oldest first; marks of cells nobody could look into are left out. */
export function cellLooks(readings: readonly BroodReading[]): Map<string, CellLook[]> {
  const looks = new Map<string, CellLook[]>();
  for (const { at, marks } of [...readings].sort((a, b) => a.at - b.at)) {
    for (const mark of marks) {
      if (NOT_LOOKED_AT.has(mark.state)) continue;
      const key = cellKey(mark);
      const own = looks.get(key);
      if (own) own.push({ at, state: mark.state });
      else looks.set(key, [{ at, state: mark.state }]);
    }
  }
  return looks;
}
