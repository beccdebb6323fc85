import { FieldError, type Fields, readList, readNumber, readObject, readText } from './file-fields';
import { isDate, readInstant } from './read-instant';
import { type DailyExtremes, type LoggerReading, POSSIBLE_C, type TemperatureRecord } from './temperature/record';
import type { Place } from './temperature/sun-times';

const MOST_ROWS = 200_000;

function readLogger(value: unknown, field: string, zone: string): LoggerReading {
  const row = readObject(value, field);
  return {
    at: readInstant(row.at, `${field}.at`, zone),
    celsius: readNumber(row.celsius, `${field}.celsius`, POSSIBLE_C),
  };
}

function readDay(value: unknown, field: string): DailyExtremes {
  const row = readObject(value, field);
  const date = readText(row.date, `${field}.date`);
  if (!isDate(date)) throw new FieldError(`${field}.date`, `"${date}" is not a date such as 2026-06-16`);
  const min = readNumber(row.min, `${field}.min`, POSSIBLE_C);
  return { date, min, max: readNumber(row.max, `${field}.max`, { ...POSSIBLE_C, min }) };
}

/** Puts rows in order, and refuses a time or day that comes twice. */
function inOrder<T>(rows: T[], field: string, key: (row: T) => number | string): T[] {
  if (rows.length > MOST_ROWS) throw new FieldError(field, `must hold at most ${MOST_ROWS} rows, has ${rows.length}`);
  const seen = new Set<number | string>();
  rows.forEach((row, i) => {
    if (seen.has(key(row))) throw new FieldError(`${field}[${i}]`, 'is of the same time as a row before it');
    seen.add(key(row));
  });
  return rows.sort((a, b) => (key(a) < key(b) ? -1 : 1));
}

function readRows(record: Fields, zone: string): TemperatureRecord {
  const kind = record.kind ?? (record.days === undefined ? 'logger' : 'daily');
  if (kind === 'daily') {
    const days = readList(record.days, 'temperature.days', readDay);
    return { kind, days: inOrder(days, 'temperature.days', ({ date }) => date) };
  }
  if (kind !== 'logger') throw new FieldError('temperature.kind', 'must be logger or daily');
  const field = 'temperature.readings';
  const readings = readList(record.readings, field, (item, at) => readLogger(item, at, zone));
  return { kind, readings: inOrder(readings, field, ({ at }) => at) };
}

/**
 * Reads the temperature member of a nest file: `{kind: 'logger', readings: [{at, celsius}]}` or `{kind: 'daily', days:
 * [{date, min, max}]}`, °C, rows in any order; `{kind: 'none'}`, null or nothing for none.
 *
 * @throws FieldError naming the member.
 */
export function readTemperature(value: unknown, zone: string): TemperatureRecord | null {
  if (value === undefined || value === null) return null;
  const record = readObject(value, 'temperature');
  return record.kind === 'none' ? null : readRows(record, zone);
}

/** Reads where the nest hangs, `{lat, lon}` in degrees, for sunrise and sunset. @throws FieldError */
export function readPlace(value: unknown): Place | null {
  if (value === undefined || value === null) return null;
  const place = readObject(value, 'place');
  return {
    lat: readNumber(place.lat, 'place.lat', { min: -90, max: 90 }),
    lon: readNumber(place.lon, 'place.lon', { min: -180, max: 180 }),
  };
}
