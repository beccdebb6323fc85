import 'server-only';
import { addDays, localDate } from '@/lib/kit/local-date';
import { startOfLocalDay } from '@/lib/kit/start-of-local-day';
import { HttpProblem } from '@/lib/server/http/problem';
import { parseLocalDate } from './local-date-range';

const INSTANT = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}(:\d{2}(\.\d{1,9})?)?(Z|[+-]\d{2}:\d{2})$/;

/** The last millisecond of a local date: everything seen that day counts. */
function endOfLocalDay(date: string, zone: string): number {
  return startOfLocalDay(addDays(date, 1), zone) - 1;
}

/**
 * The instant an estimate looks back from, in epoch milliseconds: a given instant, the end of a given local date, or
 * the end of today, so that asking again on one day asks for the same estimate.
 *
 * @param text the `asOf` parameter. A `+` that a query string turned into a space is understood.
 * @throws HttpProblem `param` when it is neither an ISO 8601 instant with offset nor a date.
 */
export function parseAsOf(text: string | undefined, zone: string, nowMs: number): number {
  if (text === undefined) return endOfLocalDay(localDate(nowMs, zone), zone);
  const instant = text.replace(/ (\d{2}:\d{2})$/, '+$1');
  if (!INSTANT.test(instant)) return endOfLocalDay(parseLocalDate(text), zone);
  const epochMs = Date.parse(instant);
  if (Number.isNaN(epochMs)) throw new HttpProblem('param');
  return epochMs;
}
