import { localParts } from '@/lib/kit/local-date';

const MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const;

interface DayParts {
  day: number;
  month: string;
  year: string;
}

function dayParts(date: string): DayParts {
  const [year = '', month = '1', day = '1'] = date.split('-');
  return { day: Number(day), month: MONTHS[Number(month) - 1] ?? '', year };
}

/** Dates of another year than this say their year: a `YYYY-MM-DD` date or just `YYYY`. */
export type YearShown = string | undefined;

/** `2026-05-06` → `6 May`; with the year when it is not the reader's (`inYear`). */
export function dateWords(date: string, inYear: YearShown = date): string {
  const { day, month, year } = dayParts(date);
  return year === inYear.slice(0, 4) ? `${day} ${month}` : `${day} ${month} ${year}`;
}

/** `2026-05-06` → `6 May 2026`. */
export function fullDateWords(date: string): string {
  return dateWords(date, '');
}

/** `2026-06-23` → `23 Jun`, for the axis of a chart. */
export function axisWords(date: string): string {
  const { day, month } = dayParts(date);
  return `${day} ${month.slice(0, 3)}`;
}

/** Both ends of a range, what they share said once: `18 and 29 June`, `29 April and 13 May`. */
export function spanWords([from, to]: readonly [string, string], inYear: YearShown = from): string {
  const [a, b] = [dayParts(from), dayParts(to)];
  if (from === to) return dateWords(from, inYear);
  const sameMonth = a.year === b.year && a.month === b.month;
  if (sameMonth) return `${a.day} and ${dateWords(to, inYear)}`;
  if (a.year === b.year) return `${a.day} ${a.month} and ${dateWords(to, inYear)}`;
  return `${fullDateWords(from)} and ${fullDateWords(to)}`;
}

/** An estimated date as two parts, the likeliest day and its range: an estimate is never a bare date. */
export interface RangeWords {
  day: string;
  range: string;
}

/**
 * Words for an estimated date: `6 May` and `between 29 April and 13 May`; `within the day` when both ends fall on it.
 *
 * @param median the likeliest day, `YYYY-MM-DD`.
 * @param ends first and last day of the range, with the median between them.
 */
export function rangeWords(median: string, ends: readonly [string, string], inYear?: YearShown): RangeWords {
  const year = inYear ?? median;
  const isOneDay = ends[0] === ends[1];
  return { day: dateWords(median, year), range: isOneDay ? 'within the day' : `between ${spanWords(ends, year)}` };
}

/** An instant in a zone: `16 June, 05:41`, with the year when it is not the reader's. */
export function momentWords(instant: string | number, zone: string, inYear?: YearShown): string {
  const { date, time } = localParts(typeof instant === 'number' ? instant : Date.parse(instant), zone);
  return `${dateWords(date, inYear ?? date)}, ${time}`;
}

/** The local day of an instant in a zone: `16 June`. */
export function dayWords(instant: string | number, zone: string, inYear?: YearShown): string {
  const { date } = localParts(typeof instant === 'number' ? instant : Date.parse(instant), zone);
  return dateWords(date, inYear ?? date);
}

/** Counted things: `1 cell`, `33 cells`. */
export function countWords(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

function runOf([from, to]: [number, number]): string {
  if (from === to) return `${from}`;
  return to === from + 1 ? `${from}, ${to}` : `${from}–${to}`;
}

/**
 * Whole numbers as runs: `[0, 1, 2, 5]` → `0–2, 5`.
 *
 * @param numbers in any order, no repeats.
 */
export function runWords(numbers: readonly number[]): string {
  const runs: [number, number][] = [];
  for (const n of [...numbers].sort((a, b) => a - b)) {
    const last = runs.at(-1);
    if (last && n === last[1] + 1) last[1] = n;
    else runs.push([n, n]);
  }
  return runs.map(runOf).join(', ');
}
