import { FieldError, readText } from './file-fields';
import { startOfLocalDay } from './local-day';

const DATE = /^(\d{4})-(\d{2})-(\d{2})$/;
const INSTANT = /^(\d{4}-\d{2}-\d{2})T\d{2}:\d{2}(:\d{2}(\.\d{1,9})?)?(Z|[+-]\d{2}:\d{2})$/;
const NOON_MS = 12 * 3_600_000;

/** Is this a day of the calendar? `2026-02-30` is not. */
export function isDate(text: string): boolean {
  const match = DATE.exec(text);
  if (!match) return false;
  const made = new Date(Date.UTC(Number(match[1]), Number(match[2]) - 1, Number(match[3])));
  return made.toISOString().slice(0, 10) === text;
}

/**
 * Reads a time with its offset, such as `2026-06-16T05:35:00-04:00`, or a bare date, taken as noon of the nest.
 *
 * @returns epoch milliseconds.
 * @throws FieldError naming the member.
 */
export function readInstant(value: unknown, field: string, zone: string): number {
  const text = readText(value, field);
  if (isDate(text)) return startOfLocalDay(text, zone) + NOON_MS;
  const date = INSTANT.exec(text)?.[1];
  const ms = Date.parse(text);
  if (date === undefined || !isDate(date) || Number.isNaN(ms)) {
    throw new FieldError(
      field,
      `"${text}" is neither a date nor a time with an offset such as 2026-06-16T05:35:00-04:00`,
    );
  }
  return ms;
}
