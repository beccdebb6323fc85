/** In which order a date is written. `iso` also stands for any date that begins with the year. */
export type DateOrder = 'iso' | 'dmy' | 'mdy';

/** A date as written: three numbers whose order may not be known, or one that names the month. */
export interface WrittenDate {
  /** Year, month and day where the text itself says which is which. */
  fixed: { year: number; month: number; day: number } | null;
  /** The two numbers before the year, as written; the year's four digits. */
  loose: { first: number; second: number; year: number } | null;
}

const MONTHS = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];
const YEAR_FIRST = /^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})$/;
const YEAR_LAST = /^(\d{1,2})([-/.])(\d{1,2})\2(\d{4}|\d{2})$/;
const DAY_MONTH_NAME = /^(\d{1,2})[-/ .]+([a-z]{3})[a-z]*[-/ .,]+(\d{4}|\d{2})$/i;
const MONTH_NAME_DAY = /^([a-z]{3})[a-z]*[-/ .]+(\d{1,2})[-/ .,]+(\d{4}|\d{2})$/i;

/** Two digits mean this century: loggers are younger than it. */
function fullYear(text: string): number {
  return text.length === 2 ? 2000 + Number(text) : Number(text);
}

function named(day: string, month: string, year: string): WrittenDate | null {
  const place = MONTHS.indexOf(month.toLowerCase());
  return place < 0 ? null : { fixed: { year: fullYear(year), month: place + 1, day: Number(day) }, loose: null };
}

/** Reads the words of a date without deciding what its numbers mean; null for anything else. */
export function writtenDate(text: string): WrittenDate | null {
  const first = YEAR_FIRST.exec(text);
  if (first) {
    const [, year, month, day] = first;
    return { fixed: { year: Number(year), month: Number(month), day: Number(day) }, loose: null };
  }
  const last = YEAR_LAST.exec(text);
  if (last) {
    const [, a, , b, year = ''] = last;
    return { fixed: null, loose: { first: Number(a), second: Number(b), year: fullYear(year) } };
  }
  const dayFirst = DAY_MONTH_NAME.exec(text);
  if (dayFirst) return named(dayFirst[1] ?? '', dayFirst[2] ?? '', dayFirst[3] ?? '');
  const monthFirst = MONTH_NAME_DAY.exec(text);
  return monthFirst ? named(monthFirst[2] ?? '', monthFirst[1] ?? '', monthFirst[3] ?? '') : null;
}

/** `YYYY-MM-DD` of a written date in a given order; null when the calendar has no such day. */
export function calendarDate({ fixed, loose }: WrittenDate, order: DateOrder): string | null {
  const numbers = fixed ?? (loose && looseNumbers(loose, order));
  if (!numbers) return null;
  const { year, month, day } = numbers;
  const made = new Date(Date.UTC(year, month - 1, day));
  const isReal = made.getUTCFullYear() === year && made.getUTCMonth() === month - 1 && made.getUTCDate() === day;
  return isReal ? made.toISOString().slice(0, 10) : null;
}

function looseNumbers({ first, second, year }: NonNullable<WrittenDate['loose']>, order: DateOrder) {
  if (order === 'iso') return null;
  return order === 'dmy' ? { year, month: second, day: first } : { year, month: first, day: second };
}

/**
 * The order that a column of dates can only have: `iso` where each says it itself, otherwise whichever no date speaks
 * against; null when both would do or neither does.
 */
export function provenOrder(dates: readonly WrittenDate[]): DateOrder | 'either' | 'neither' {
  const loose = dates.flatMap((date) => date.loose ?? []);
  if (loose.length === 0) return 'iso';
  const canBeDayFirst = loose.every(({ second }) => second <= 12);
  const canBeMonthFirst = loose.every(({ first }) => first <= 12);
  if (canBeDayFirst && canBeMonthFirst) return 'either';
  if (!canBeDayFirst && !canBeMonthFirst) return 'neither';
  return canBeDayFirst ? 'dmy' : 'mdy';
}
