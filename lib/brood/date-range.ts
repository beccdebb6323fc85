import { localDate } from '@/lib/kit/local-date';
import type { DateRange, Spread } from './answer';
import { type DayLaw, quantileDays } from './day-law';

/** Milliseconds of a day; the model counts days of 24 hours, whatever the clocks do. */
export const DAY_MS = 86_400_000;

/** How a time in days becomes an instant. */
interface DateFrame {
  /** The instant the days are counted from, epoch milliseconds. */
  at: number;
  zone: string;
  /** `back`: the event lies before `at`. */
  direction: 'back' | 'on';
  /** Days the event is moved by in addition. */
  shiftDays?: number;
}

function spread(show: (p: number) => string): Spread {
  const central = (mass: number): [string, string] => [show((1 - mass) / 2), show((1 + mass) / 2)];
  return { median: show(0.5), p50: central(0.5), p80: central(0.8), p95: central(0.95) };
}

/** The date of an event whose distance from a sighting follows a law: median and central ranges, local and UTC. */
export function dateRange(law: DayLaw, { at, zone, direction, shiftDays = 0 }: DateFrame): DateRange {
  const instant = (p: number): number => {
    const days = direction === 'on' ? quantileDays(law.mixed, p) : -quantileDays(law.mixed, 1 - p);
    return Math.round(at + (days + shiftDays) * DAY_MS);
  };
  return { ...spread((p) => localDate(instant(p), zone)), utc: spread((p) => new Date(instant(p)).toISOString()) };
}
