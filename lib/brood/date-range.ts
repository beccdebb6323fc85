import { localDate } from '@/lib/kit/local-date';
import type { DateRange, Spread } from './answer';
import { type TimeLaw, lawQuantile } from './time-law';

/** Milliseconds of a day; the model counts days of 24 hours, whatever the clocks do. */
export const DAY_MS = 86_400_000;

/** How a time in days becomes an instant. */
export interface DateFrame {
  /** The instant the days are counted from, epoch milliseconds. */
  origin: number;
  zone: string;
  /** Days the event is moved by in addition. */
  shiftDays?: number;
}

function spread(show: (p: number) => string): Spread {
  const central = (mass: number): [string, string] => [show((1 - mass) / 2), show((1 + mass) / 2)];
  return { median: show(0.5), p50: central(0.5), p80: central(0.8), p95: central(0.95) };
}

/** The date of an event that follows a law: median and central ranges, local and UTC. */
export function dateRange(law: TimeLaw, { origin, zone, shiftDays = 0 }: DateFrame): DateRange {
  const instant = (p: number): number => Math.round(origin + (lawQuantile(law, p) + shiftDays) * DAY_MS);
  return { ...spread((p) => localDate(instant(p), zone)), utc: spread((p) => new Date(instant(p)).toISOString()) };
}
