import type { FoundTable } from './find-table';
import { isTimeOfDay, offsetOf, writtenMoment } from './moment-text';
import { writtenNumber } from './number-text';
import type { FileLine } from './split-cells';

/** Where a file keeps what; columns are counted from 0. */
export interface FoundColumns {
  date: number;
  /** The time of day, where it has a column of its own. */
  time: number | null;
  /** Columns that may be the temperature, likeliest first. */
  temperature: readonly number[];
  /** Lowest and highest of a day, where the file gives both. */
  extremes: { min: number; max: number } | null;
  /** A column that only says C or F. */
  unit: number | null;
  /** Minutes east of UTC that the name of the time column gives. */
  offsetMinutes: number | null;
}

/** A column must hold such cells in this share of its lines. */
const MOSTLY = 0.6;
const LOOK_AT = 200;

const TEMPERATURE = /temp|°|celsius|fahrenheit|\bdeg|\b[cf]\b/i;
const OTHER =
  /dew|humid|\brh\b|%|press|light|lux|volt|batt|wet ?bulb|heat ?index|count|^#$|\bno\b|\bnr\b|number|serial/i;
const MIN = /min|low|tiefst/i;
const MAX = /max|high|höchst/i;
const ZONE = /\b(?:utc|gmt)\s*([+-]\d{1,2}(?::?\d{2})?)?/i;

function columnsOf(body: readonly FileLine[], test: (cell: string) => boolean): number[] {
  const lines = body.slice(0, LOOK_AT);
  const width = Math.max(...lines.map(({ cells }) => cells.length));
  return Array.from({ length: width }, (_, i) => i).filter((i) => {
    const filled = lines.filter(({ cells }) => (cells[i] ?? '') !== '');
    return filled.length > 0 && filled.filter(({ cells }) => test(cells[i] ?? '')).length >= MOSTLY * filled.length;
  });
}

function named(header: readonly string[], columns: readonly number[], pattern: RegExp): number[] {
  return columns.filter((i) => pattern.test(header[i] ?? ''));
}

/** A column of whole numbers that rise by one is a count of lines. */
function isCount({ body }: FoundTable, column: number): boolean {
  const numbers = body.slice(0, LOOK_AT).map(({ cells }) => Number(cells[column]));
  return numbers.length > 1 && numbers.every((value, i) => i === 0 || value === (numbers[i - 1] ?? 0) + 1);
}

function temperatureColumns(table: FoundTable, numbers: readonly number[]): number[] {
  const header = table.header?.cells ?? [];
  const likely = named(header, numbers, TEMPERATURE).filter((i) => !OTHER.test(header[i] ?? ''));
  if (likely.length > 0) return likely;
  return numbers.filter((i) => !OTHER.test(header[i] ?? '') && !isCount(table, i));
}

/** One column each that its name calls the lowest and the highest of a day. */
function extremeColumns(header: readonly string[], numbers: readonly number[]): FoundColumns['extremes'] {
  const [min, ...otherMin] = named(header, numbers, MIN);
  const [max, ...otherMax] = named(header, numbers, MAX);
  const isOne = otherMin.length + otherMax.length === 0;
  return min !== undefined && max !== undefined && min !== max && isOne ? { min, max } : null;
}

/** Minutes east of UTC named in the heading of the time; null when none is. */
function headingOffset(heading: string): number | null {
  const match = ZONE.exec(heading);
  return match && offsetOf(match[1] ?? 'utc');
}

/** Finds what each column holds, by its cells first and its name second; null without a column of dates. */
export function findColumns(table: FoundTable): FoundColumns | null {
  const header = table.header?.cells ?? [];
  const [date] = columnsOf(table.body, (cell) => writtenMoment(cell) !== null);
  if (date === undefined) return null;
  const [time = null] = columnsOf(table.body, isTimeOfDay).filter((i) => i !== date);
  const [unit = null] = columnsOf(table.body, (cell) => /^°?\s*[cf]$/i.test(cell));
  const numbers = columnsOf(table.body, (cell) => writtenNumber(cell) !== null).filter((i) => i !== date && i !== time);
  return {
    date,
    time,
    temperature: temperatureColumns(table, numbers),
    extremes: time === null ? extremeColumns(header, numbers) : null,
    unit,
    offsetMinutes: headingOffset(header[date] ?? '') ?? headingOffset(time === null ? '' : (header[time] ?? '')),
  };
}
