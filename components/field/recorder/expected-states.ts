import { type Axial, cellKey, parseCellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import { byWalkOrder } from '@/lib/comb/walk';
import type { RecorderView } from '@/lib/offline/recorder-view';

/** What the estimate expects in cells today, by `cellKey`. */
export type ExpectedStates = ReadonlyMap<string, CellState>;

/** At a first reading, in a second one, and where the phone cannot estimate. */
export const NOTHING_EXPECTED: ExpectedStates = new Map();

/** What is expected in the current cell; null when it bears a mark already or nothing is expected there. */
export function expectedHere({ current, marks }: Pick<RecorderView, 'current' | 'marks'>, expected: ExpectedStates) {
  if (!current || marks.has(cellKey(current))) return null;
  return expected.get(cellKey(current)) ?? null;
}

/** The cells known from the last visit that bear no mark yet, with what is expected there, in walk order. */
export function stillExpected(
  { last, marks, skipped }: Pick<RecorderView, 'last' | 'marks' | 'skipped'>,
  expected: ExpectedStates,
): (Axial & { state: CellState })[] {
  const open = [...expected].filter(([key]) => last.has(key) && !marks.has(key) && !skipped.has(key));
  return open.map(([key, state]) => ({ ...parseCellKey(key), state })).sort(byWalkOrder);
}
