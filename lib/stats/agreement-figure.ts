import { type Resampling, bootstrapInterval } from './bootstrap-interval';
import type { ConfusionTable } from './confusion-table';
import type { Interval } from './interval';
import { normalInterval } from './normal-interval';

/** Why a figure has no value. */
export type MissingReason = 'nothing-compared' | 'one-word-only';

/** One figure of agreement, with where it probably lies. */
export interface AgreementFigure {
  /** Null when the figure is undefined. */
  value: number | null;
  /** 95 %; null when there is no value, too few draws had one, or all draws had the same, as after full agreement. */
  interval: Interval | null;
  /** How the interval was made: from the large-sample variance, or by drawing the cells again. */
  intervalBy: 'variance' | 'draws' | null;
  /** Pairs it is made from. */
  n: number;
  /** Why there is no value; null when there is one. */
  missing: MissingReason | null;
}

/** From this many pairs on the large-sample variance of kappa is trusted. */
const LARGE_SAMPLE = 50;
const LIMITS: Interval = { low: -1, high: 1 };

/** An interval without width would claim certainty that a sample can't give. */
function withWidth(interval: Interval | null): Interval | null {
  return interval && interval.high - interval.low > 1e-9 ? interval : null;
}

/** A figure that a table gives. */
export interface AgreementStatistic {
  /** Null where it is undefined. Worked out once for the table and once for each draw. */
  value: (table: ConfusionTable) => number | null;
  /** The large-sample variance, where there is a formula. */
  variance?: (table: ConfusionTable) => number | null;
}

/** Every pair behind the table as the number of its field. */
function fieldsOf(table: ConfusionTable): number[] {
  const counts = table.flat();
  return counts.flatMap((count, field) => Array.from({ length: count }, () => field));
}

function tableOf(fields: readonly number[], size: number): number[][] {
  const counts = Array.from({ length: size * size }, () => 0);
  for (const field of fields) counts[field] = (counts[field] ?? 0) + 1;
  return Array.from({ length: size }, (_, row) => counts.slice(row * size, (row + 1) * size));
}

/**
 * A statistic of agreement with its interval: from its variance when it has one and there are at least 50 pairs, by
 * drawing the pairs again otherwise.
 *
 * @param table counts of two readers.
 * @param resampling a fresh seeded source, and how many draws; none gives no such interval.
 */
export function agreementFigure(
  table: ConfusionTable,
  statistic: AgreementStatistic,
  resampling: Resampling,
): AgreementFigure {
  const fields = fieldsOf(table);
  const n = fields.length;
  const value = statistic.value(table);
  if (value === null) {
    const missing = n === 0 ? 'nothing-compared' : 'one-word-only';
    return { value: null, interval: null, intervalBy: null, n, missing };
  }
  const variance = n < LARGE_SAMPLE ? null : (statistic.variance?.(table) ?? null);
  if (variance !== null) {
    const interval = withWidth(normalInterval(value, variance, LIMITS));
    return { value, interval, intervalBy: interval && 'variance', n, missing: null };
  }
  const again = (drawn: readonly number[]) => statistic.value(tableOf(drawn, table.length));
  const interval = withWidth(bootstrapInterval(fields, again, resampling));
  return { value, interval, intervalBy: interval && 'draws', n, missing: null };
}
