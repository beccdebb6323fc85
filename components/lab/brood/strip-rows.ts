import type { BroodStrip } from '@/components/charts/strips-drawing';
import type { BroodRow } from '@/components/lab/brood-rows';
import { runWords } from '@/components/ui/date-words';
import { CELL_STATES } from '@/lib/comb/states';

/** What the strips can be sorted by, with its words. */
export const STRIP_SORTS = {
  laid: 'oldest first',
  cell: 'by cell number',
  capped: 'capped soonest',
  emerges: 'adult soonest',
  state: 'by what was seen',
} as const;

/** One of the sorts. */
export type StripSort = keyof typeof STRIP_SORTS;

/** Is this one of the sorts? */
export function isStripSort(text: string): text is StripSort {
  return Object.hasOwn(STRIP_SORTS, text);
}

/** A date to sort by; what is not known comes last. */
const dated = (spread: { median: string } | null): string => spread?.median ?? '9999';

const KEYS: Readonly<Record<StripSort, (row: BroodRow) => string | number>> = {
  laid: (row) => dated(row.laid),
  cell: (row) => row.cells[0] ?? 0,
  capped: (row) => dated(row.capped),
  emerges: (row) => dated(row.emerges),
  state: (row) => -CELL_STATES.indexOf(row.state),
};

function compare(a: string | number, b: string | number): number {
  if (typeof a === 'number' && typeof b === 'number') return a - b;
  return String(a).localeCompare(String(b));
}

/** One row a cell, from rows of cells with equal dates. */
function apart(rows: readonly BroodRow[]): BroodRow[] {
  return rows.flatMap((row) => row.cells.map((cell) => ({ ...row, cells: [cell] })));
}

/** The rows to draw: equal cells together or each alone, in an order; equal keys stay in the order of cells. */
export function stripRows(
  rows: readonly BroodRow[],
  { sort, grouped }: { sort: StripSort; grouped: boolean },
): BroodRow[] {
  const keyOf = KEYS[sort];
  const shown = grouped ? [...rows] : apart(rows);
  return shown.sort((a, b) => compare(keyOf(a), keyOf(b)) || (a.cells[0] ?? 0) - (b.cells[0] ?? 0));
}

/** A row as the drawing takes it. */
export function stripOf({ cells, state, laid, capped, emerges }: BroodRow): BroodStrip {
  const short = runWords(cells);
  const label = `${cells.length === 1 ? 'cell' : 'cells'} ${short}`;
  return { key: cells.join(), label, short, state, laid, capped, emerges };
}
