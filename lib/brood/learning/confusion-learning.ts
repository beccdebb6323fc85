import {
  type ConfusionRow,
  type ConfusionRows,
  RECORDED_CLASSES,
  type RecordedClass,
  TRUE_CLASSES,
  type TrueClass,
} from '@/lib/brood/team-settings/confusion-rows';

/** One cell that two people read: what it was settled to be, and what one of them had recorded. */
export interface SettledCell {
  truth: RecordedClass;
  /** The instar the settled reading gives, 1 to 5; null where it gives none. */
  instar: number | null;
  seen: RecordedClass;
}

/** Cells of each recorded class; a cell that may belong to several rows is shared out among them. */
export type RowCounts = Partial<Record<RecordedClass, number>>;

/** One row before and after the team's own cells. */
export interface LearnedRow {
  name: TrueClass;
  prior: ConfusionRow;
  counts: RowCounts;
  /** Cells behind the row. */
  n: number;
  posterior: ConfusionRow;
}

/** The true classes that a settled class may be; small larvae are instars 1 to 3. */
const MAY_BE: Readonly<Record<RecordedClass, readonly TrueClass[]>> = {
  absent: ['absent'],
  empty: ['empty'],
  egg: ['egg'],
  small: ['L1', 'L2', 'L3'],
  medium: ['L4'],
  large: ['L5'],
  capped: ['pupa'],
  opened: ['emerged'],
};

const INSTARS: readonly TrueClass[] = ['L1', 'L2', 'L3', 'L4', 'L5'];

/**
 * The rows a cell counts for, with its share in each: the instar where it is known, otherwise each instar of the
 * class (they last equally long) by how likely it makes what was seen.
 */
function sharesOf({ truth, instar, seen }: SettledCell, prior: ConfusionRows): [TrueClass, number][] {
  const known = instar === null ? undefined : INSTARS[instar - 1];
  if (known && MAY_BE[truth].includes(known)) return [[known, 1]];
  const names = MAY_BE[truth];
  const likely = names.map((name) => prior[name].row[seen] ?? 0);
  const total = likely.reduce((sum, share) => sum + share, 0);
  return names.map((name, i) => [name, total > 0 ? (likely[i] ?? 0) / total : 1 / names.length]);
}

function countsOf(cells: readonly SettledCell[], prior: ConfusionRows): ReadonlyMap<TrueClass, RowCounts> {
  const counts = new Map<TrueClass, RowCounts>(TRUE_CLASSES.map((name) => [name, {}]));
  for (const cell of cells) {
    for (const [name, share] of sharesOf(cell, prior)) {
      const row = counts.get(name);
      if (row && share > 0) row[cell.seen] = (row[cell.seen] ?? 0) + share;
    }
  }
  return counts;
}

/** Mean of the Dirichlet posterior: pseudo-cells of the prior and real cells together, as shares. */
function posteriorRow(prior: ConfusionRow, counts: RowCounts, pseudoCount: number): ConfusionRow {
  const weights = RECORDED_CLASSES.map(
    (seen) => [seen, pseudoCount * (prior[seen] ?? 0) + (counts[seen] ?? 0)] as const,
  ).filter(([, weight]) => weight > 0);
  const total = weights.reduce((sum, [, weight]) => sum + weight, 0);
  return Object.fromEntries(weights.map(([seen, weight]) => [seen, weight / total]));
}

/**
 * What the team's own double readings say about its readers: each row is a Dirichlet prior of `pseudoCount` cells in
 * the shares of the row before, updated by the settled cells. Errors that both readers share are not seen.
 *
 * @returns the rows that cells speak for, in the order of development.
 */
export function learnConfusion(cells: readonly SettledCell[], prior: ConfusionRows, pseudoCount: number): LearnedRow[] {
  const counts = countsOf(cells, prior);
  return TRUE_CLASSES.flatMap((name) => {
    const row = counts.get(name) ?? {};
    const n = Object.values(row).reduce((sum, count) => sum + count, 0);
    const before = prior[name].row;
    return n > 0 ? [{ name, prior: before, counts: row, n, posterior: posteriorRow(before, row, pseudoCount) }] : [];
  });
}
