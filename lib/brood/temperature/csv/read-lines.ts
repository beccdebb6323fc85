import { type Result, err, ok } from '@/lib/kit/result';
import type { FoundColumns } from './find-columns';
import { type DateOrder, calendarDate } from './date-text';
import type { FileNote } from './file-note';
import { type LocalInstants } from '@/lib/brood/temperature/local-instants';
import { isPossible } from '@/lib/brood/temperature/record';
import { type WrittenMoment, writtenMoment } from './moment-text';
import { type Decimal, numberValue, toCelsius, writtenNumber } from './number-text';
import type { FileLine } from './split-cells';

const MINUTE_MS = 60_000;

/** How the cells of a file are to be read. */
export interface ReadingRules {
  columns: FoundColumns;
  order: DateOrder;
  decimal: Decimal;
  unit: 'C' | 'F';
  instants: LocalInstants;
}

/** The moment a line was written at, date and time together. */
export function momentOf({ cells }: FileLine, { date, time }: FoundColumns): WrittenMoment | null {
  const text = cells[date] ?? '';
  return writtenMoment(time === null ? text : `${text} ${cells[time] ?? ''}`);
}

const note = (code: FileNote['code'], line: number, text: string): FileNote => ({ code, line, text });

/** The temperature in a cell of a line, °C, or why there is none. */
export function celsiusOf(line: FileLine, column: number, rules: ReadingRules): Result<number, FileNote> {
  const text = line.cells[column] ?? '';
  const written = writtenNumber(text);
  const value = written && numberValue(written, rules.decimal);
  if (!written || value === null) {
    const what = text === '' ? 'has no temperature' : `"${text.slice(0, 40)}" is not a temperature`;
    return err(note('unreadable-value', line.number, `Line ${line.number}: ${what}; left out.`));
  }
  const celsius = toCelsius(value, written.unit ?? rules.unit);
  if (isPossible(celsius)) return ok(celsius);
  return err(note('impossible', line.number, `Line ${line.number}: ${text} cannot be; left out.`));
}

/** The local date of a line, or why there is none. */
export function dateOf(line: FileLine, rules: ReadingRules): Result<string, FileNote> {
  const moment = momentOf(line, rules.columns);
  const date = moment && calendarDate(moment.date, rules.order);
  if (date) return ok(date);
  const text = (line.cells[rules.columns.date] ?? '').slice(0, 40);
  return err(note('unreadable-time', line.number, `Line ${line.number}: "${text}" is not a date; left out.`));
}

/**
 * The instant of a line, or why there is none. Where the clocks showed a time twice, the second showing is meant once
 * the first has been passed.
 *
 * @param passed the latest instant read so far.
 */
export function instantOf(line: FileLine, rules: ReadingRules, passed: number): Result<number, FileNote> {
  const date = dateOf(line, rules);
  if (!date.ok) return date;
  const moment = momentOf(line, rules.columns);
  if (!moment || moment.timeMs === null) {
    return err(note('unreadable-time', line.number, `Line ${line.number}: has no time of day; left out.`));
  }
  const wall = Date.parse(`${date.value}T00:00:00Z`) + moment.timeMs;
  const offset = moment.offsetMinutes ?? rules.columns.offsetMinutes;
  if (offset !== null) return ok(wall - offset * MINUTE_MS);
  const shown = rules.instants(wall);
  const at = shown.find((instant) => instant > passed) ?? shown[0];
  if (at !== undefined) return ok(at);
  return err(
    note('skipped-hour', line.number, `Line ${line.number}: the clocks skipped this time that night; left out.`),
  );
}
