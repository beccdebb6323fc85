import { CELL_STATES, type CellState } from '@/lib/comb/states';
import n12 from '@/tests/fixtures/comb/n12.json';
import type { MarkInput } from '@/tests/support/factories/make-reading';

const LETTERS: Readonly<Record<string, CellState>> = {
  c: 'capped',
  l: 'large',
  m: 'medium',
  s: 'small',
  e: 'egg',
  p: 'parasitised',
  '-': 'empty',
};

/** One cell of the reference nest as three readings have it. */
export interface N12Cell {
  cell: number;
  q: number;
  r: number;
  field: CellState;
  blind: CellState;
  final: CellState;
}

function stateOf(letter: unknown): CellState {
  const state = LETTERS[String(letter)];
  if (!state) throw new Error(`no state has the letter ${String(letter)}`);
  return state;
}

/** The 33 cells of nest N12. */
export const N12: readonly N12Cell[] = n12.cells.map(([cell, q, r, field, blind, final]) => ({
  cell: Number(cell),
  q: Number(q),
  r: Number(r),
  field: stateOf(field),
  blind: stateOf(blind),
  final: stateOf(final),
}));

/** Marks of one of the readings of N12, in walk order. */
export function n12Marks(reading: 'field' | 'blind' | 'final'): MarkInput[] {
  return N12.map((cell) => ({ q: cell.q, r: cell.r, state: cell[reading] }));
}

/** The four cells in which the two readings of N12 differ, as they were settled, in walk order. */
export function n12Decisions(reasonFor: (cell: number) => string = () => 'The photo shows it.') {
  const different = N12.filter(({ field, blind }) => field !== blind);
  return different.map(({ cell, q, r, final }) => ({ q, r, state: final, reason: reasonFor(cell) }));
}

/** Counts of a reading in the order of the states, for comparing with what was counted by hand. */
export function n12Counts(counts: Partial<Record<CellState, number>>): Record<CellState, number> {
  return Object.fromEntries(CELL_STATES.map((state) => [state, counts[state] ?? 0])) as Record<CellState, number>;
}
