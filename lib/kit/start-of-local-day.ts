import { localDate } from './local-date';

const HOUR_MS = 3_600_000;
/** No zone is further from UTC than 14 hours either way. */
const FURTHEST_MS = 15 * HOUR_MS;

/**
 * The first instant (epoch milliseconds) of a local date: usually midnight, later where clocks skip midnight.
 *
 * @param date a real `YYYY-MM-DD` date.
 * @param zone an IANA zone.
 */
export function startOfLocalDay(date: string, zone: string): number {
  const utcMidnight = Date.parse(`${date}T00:00:00Z`);
  let before = utcMidnight - FURTHEST_MS;
  let after = utcMidnight + FURTHEST_MS;
  while (after - before > 1) {
    const middle = Math.floor((before + after) / 2);
    if (localDate(middle, zone) < date) before = middle;
    else after = middle;
  }
  return after;
}
