import 'server-only';
import { addDays } from '@/lib/kit/local-date';
import { startOfLocalDay } from '@/lib/kit/start-of-local-day';
import { HttpProblem } from '@/lib/server/http/problem';

/** Local dates from and to, both included; undefined leaves that side open. */
export interface LocalDateRange {
  from?: string;
  to?: string;
}

/** Instants from (included) and before (left out); null leaves that side open. */
export interface InstantRange {
  from: Date | null;
  before: Date | null;
}

const DATE = /^[1-9]\d{3}-\d{2}-\d{2}$/;
/** The last date that has a day after it which the database can hold. */
const LAST_DATE = '9999-12-30';

/**
 * A real `YYYY-MM-DD` date from a query parameter, from the year 1000 on.
 *
 * @throws HttpProblem `param` for anything else, such as 2026-02-30.
 */
export function parseLocalDate(text: string): string {
  const real = DATE.test(text) && text <= LAST_DATE && addDaysOrNull(text) === text;
  if (!real) throw new HttpProblem('param');
  return text;
}

/** The date written anew, which differs for a day that its month does not have; null for a month there is none of. */
function addDaysOrNull(date: string): string | null {
  return Number.isNaN(Date.parse(`${date}T00:00:00Z`)) ? null : addDays(date, 0);
}

/** The instants that fall on a range of local dates in a zone. */
export function instantRange({ from, to }: LocalDateRange, zone: string): InstantRange {
  return {
    from: from === undefined ? null : new Date(startOfLocalDay(from, zone)),
    before: to === undefined ? null : new Date(startOfLocalDay(addDays(to, 1), zone)),
  };
}
