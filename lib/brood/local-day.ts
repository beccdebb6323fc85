import { localDate, localParts } from '@/lib/kit/local-date';

const HOUR_MS = 3_600_000;

/** The wall time of an instant in a zone, read as if it were UTC. */
function wallMs(epochMs: number, zone: string): number {
  const { date, time } = localParts(epochMs, zone);
  return Date.parse(`${date}T${time}:00Z`);
}

/** The first instant between two that lies on `date` or later, to the millisecond. */
function firstInstant(date: string, zone: string, range: { before: number; after: number }): number {
  let { before, after } = range;
  while (after - before > 1) {
    const middle = Math.floor((before + after) / 2);
    if (localDate(middle, zone) < date) before = middle;
    else after = middle;
  }
  return after;
}

/**
 * The instant a local day begins: midnight, or the first moment after it where the clocks skip midnight.
 *
 * @param date `YYYY-MM-DD`.
 * @param zone an IANA zone.
 */
export function startOfLocalDay(date: string, zone: string): number {
  const midnight = Date.parse(`${date}T00:00:00Z`);
  const guess = midnight - (wallMs(midnight, zone) - midnight);
  const isStart = localDate(guess, zone) === date && localDate(guess - 1, zone) < date;
  if (isStart) return guess;
  return firstInstant(date, zone, { before: midnight - 26 * HOUR_MS, after: midnight + 26 * HOUR_MS });
}
