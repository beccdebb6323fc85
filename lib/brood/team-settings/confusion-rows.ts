import type { Trust } from '@/lib/brood/trust';

/** What may truly be at a place of the comb. `empty` also stands for brood lost, `emerged` for an adult come out. */
export const TRUE_CLASSES = ['absent', 'empty', 'egg', 'L1', 'L2', 'L3', 'L4', 'L5', 'pupa', 'emerged'] as const;

/** What a reader may record there. */
export const RECORDED_CLASSES = ['absent', 'empty', 'egg', 'small', 'medium', 'large', 'capped', 'opened'] as const;

/** One of the true classes. */
export type TrueClass = (typeof TRUE_CLASSES)[number];

/** One of the recorded classes. */
export type RecordedClass = (typeof RECORDED_CLASSES)[number];

/** How often each class is recorded where one is true; classes left out are never recorded. Sums to 1. */
export type ConfusionRow = Readonly<Partial<Record<RecordedClass, number>>>;

/** One row with how far it can be trusted and where it comes from. */
export interface HeldRow {
  row: ConfusionRow;
  trust: Trust;
  source: string;
}

/** A row for every true class. */
export type ConfusionRows = Readonly<Record<TrueClass, HeldRow>>;

const SOURCE = 'no published error rates of readers; replaced by the team’s own double readings as they come';
const assumed = (row: ConfusionRow): HeldRow => ({ row, trust: 'assumption', source: SOURCE });

/** The rows a new team starts with. */
export const DEFAULT_CONFUSION: ConfusionRows = {
  absent: assumed({ absent: 1 }),
  empty: assumed({ empty: 0.97, egg: 0.03 }),
  egg: assumed({ egg: 0.94, empty: 0.05, small: 0.01 }),
  L1: assumed({ small: 0.97, egg: 0.03 }),
  L2: assumed({ small: 1 }),
  L3: assumed({ small: 0.95, medium: 0.05 }),
  L4: assumed({ medium: 0.88, small: 0.06, large: 0.06 }),
  L5: assumed({ large: 0.93, medium: 0.05, capped: 0.02 }),
  pupa: assumed({ capped: 0.985, large: 0.015 }),
  emerged: assumed({ opened: 0.9, empty: 0.1 }),
};

/** Rounding that a person typing shares may leave. */
const SUM_TOLERANCE = 1e-9;

/** Is this one of the recorded classes? */
export function isRecordedClass(name: string): name is RecordedClass {
  return (RECORDED_CLASSES as readonly string[]).includes(name);
}

/** The sum of a row. */
export function rowSum(row: ConfusionRow): number {
  return Object.values(row).reduce((sum, share) => sum + share, 0);
}

/** What is wrong with a row, in words that name it; null when nothing is. */
export function rowTrouble(name: string, row: Readonly<Record<string, number>>): string | null {
  const unknown = Object.keys(row).find((seen) => !isRecordedClass(seen));
  if (unknown !== undefined) return `Confusion, row ${name}: ${unknown} is not a class that can be recorded.`;
  if (Object.values(row).some((share) => !(share >= 0 && share <= 1))) {
    return `Confusion, row ${name}: every share must be between 0 and 1.`;
  }
  const sum = rowSum(row);
  if (Math.abs(sum - 1) <= SUM_TOLERANCE) return null;
  return `Confusion, row ${name}: the shares add up to ${Number(sum.toFixed(6))}, not to 1.`;
}
