import { addDays, daysBetween } from '@/lib/kit/local-date';

/** A stretch of days drawn across a chart: `from` at the left edge, `to` at the right. */
export interface DayScale {
  from: string;
  to: string;
  days: number;
}

/**
 * A scale that holds all the given dates with some days of room at both ends.
 *
 * @param dates `YYYY-MM-DD`, any order.
 * @returns null when there are no dates.
 */
export function dayScale(dates: readonly string[], room = 3): DayScale | null {
  const sorted = [...dates].sort();
  const [first, last] = [sorted[0], sorted.at(-1)];
  if (!first || !last) return null;
  const [from, to] = [addDays(first, -room), addDays(last, room)];
  return { from, to, days: Math.max(1, daysBetween(from, to)) };
}

/** Where a date lies on a scale, in percent of its width; rounded so that markup stays short. */
export function percentOf({ from, days }: DayScale, date: string): number {
  return Math.round((daysBetween(from, date) / days) * 10_000) / 100;
}

/** Does a date lie on a scale? */
export function isOn({ from, to }: DayScale, date: string): boolean {
  return from <= date && date <= to;
}

const STEPS = [1, 2, 7, 14, 21, 28, 56, 84] as const;

/**
 * Days to label under a chart: evenly spaced, at most `most`, none so close to an edge that its words would be cut.
 */
export function dayTicks({ from, days }: DayScale, most = 5): string[] {
  const step = STEPS.find((size) => days / size <= most) ?? 84;
  const ticks: string[] = [];
  const edge = days * 0.06;
  for (let day = Math.ceil(edge); day <= days - edge; day += step) ticks.push(addDays(from, day));
  return ticks;
}
