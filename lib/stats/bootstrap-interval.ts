import type { Random } from '@/lib/kit/random';
import type { Interval } from './interval';

/** How the drawing is done. */
export interface Resampling {
  random: Random;
  /** Number of draws. */
  draws: number;
}

function drawAgain<T>(items: readonly T[], random: Random): T[] {
  return items.map((item) => items[Math.floor(random() * items.length)] ?? item);
}

/** The value below which the given share of the sorted values lies, between neighbours in proportion. */
function quantile(sorted: readonly number[], share: number): number {
  const at = share * (sorted.length - 1);
  const below = sorted[Math.floor(at)] ?? NaN;
  const above = sorted[Math.ceil(at)] ?? NaN;
  return below + (above - below) * (at - Math.floor(at));
}

/**
 * The 95 % percentile interval of a statistic, by drawing the items again with replacement.
 *
 * Source: Efron & Tibshirani 1993, An Introduction to the Bootstrap, chapter 13.
 *
 * @param items what is drawn: cells, or groups of cells when they hang together.
 * @param statistic null for a draw in which it is undefined; such draws are left out.
 * @returns null when fewer than half of the draws gave a value.
 */
export function bootstrapInterval<T>(
  items: readonly T[],
  statistic: (drawn: readonly T[]) => number | null,
  { random, draws }: Resampling,
): Interval | null {
  const values: number[] = [];
  for (let draw = 0; draw < draws; draw += 1) {
    const value = statistic(drawAgain(items, random));
    if (value !== null) values.push(value);
  }
  if (values.length * 2 < draws || values.length === 0) return null;
  values.sort((a, b) => a - b);
  return { low: quantile(values, 0.025), high: quantile(values, 0.975) };
}
