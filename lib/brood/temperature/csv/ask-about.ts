import { type DateOrder, provenOrder } from './date-text';
import type { FoundColumns } from './find-columns';
import type { FoundTable } from './find-table';
import type { FileAnswers, FileLayout, FileQuestion } from './layout';
import { momentOf } from './read-lines';
import { type Decimal, numberValue, toCelsius, writtenNumber } from './number-text';

/** No brood lives through this, °C: a file without a unit that goes above it may be in °F. */
const BELOW_FOR_CELSIUS = 45;

/** The name of a column, or its number counted from 1. */
export function columnName({ header }: FoundTable, column: number): string {
  return header?.cells[column] || `column ${column + 1}`;
}

/** The order of the dates, `null` when the dates contradict each other, or the question. */
export function orderOf(
  table: FoundTable,
  columns: FoundColumns,
  answer: FileAnswers['order'],
): DateOrder | FileQuestion | null {
  const dates = table.body.flatMap((line) => momentOf(line, columns)?.date ?? []);
  const proven = provenOrder(dates);
  if (proven === 'neither') return null;
  if (proven !== 'either') return proven;
  if (answer) return answer;
  const example = table.body[0]?.cells[columns.date] ?? '';
  return {
    code: 'date-order',
    text: `Dates such as ${example} may have the day or the month first. Which is it?`,
    choices: [
      { value: 'dmy', label: 'Day first' },
      { value: 'mdy', label: 'Month first' },
    ],
  };
}

/** The decimal sign: a comma only where a comma stands in a number and no point does. */
export function decimalOf({ body }: FoundTable, columns: readonly number[]): Decimal {
  const digits = body.flatMap(({ cells }) => columns.flatMap((i) => writtenNumber(cells[i] ?? '')?.digits ?? []));
  return digits.some((text) => text.includes(',')) && !digits.some((text) => text.includes('.')) ? ',' : '.';
}

/** The unit that a text names. */
function unitIn(text: string): 'C' | 'F' | null {
  if (/°\s*f|fahrenheit|\bdeg(rees)?\.?\s*f\b|[([_ ]f[)\]]?\s*$|^°?f$/i.test(text)) return 'F';
  if (/°\s*c|celsius|\bdeg(rees)?\.?\s*c\b|[([_ ]c[)\]]?\s*$|^°?c$/i.test(text)) return 'C';
  return null;
}

/** The unit the file itself gives: in the column's name, in a column of units, or behind the numbers. */
function unitOfFile(table: FoundTable, columns: FoundColumns, column: number): 'C' | 'F' | null {
  const [first] = table.body;
  const beside = columns.unit === null ? '' : (first?.cells[columns.unit] ?? '');
  const cell = first?.cells[column] ?? '';
  return unitIn(table.header?.cells[column] ?? '') ?? unitIn(beside) ?? writtenNumber(cell)?.unit ?? null;
}

/** The unit and how it is known, or the question. A person's word counts where the file has none. */
export function unitOf(
  table: FoundTable,
  { columns, column, decimal }: { columns: FoundColumns; column: number; decimal: Decimal },
  answer: FileAnswers['unit'],
): Pick<FileLayout, 'unit' | 'unitFrom'> | FileQuestion {
  const unit = unitOfFile(table, columns, column);
  if (unit) return { unit, unitFrom: 'file' };
  if (answer) return { unit: answer, unitFrom: 'person' };
  const values = table.body.flatMap(({ cells }) => {
    const written = writtenNumber(cells[column] ?? '');
    return (written && numberValue(written, decimal)) ?? [];
  });
  const highest = values.reduce((a, b) => Math.max(a, b), -Infinity);
  if (highest <= BELOW_FOR_CELSIUS) return { unit: 'C', unitFrom: 'values' };
  return {
    code: 'unit',
    text: `The file names no unit and goes up to ${highest}. Is it °C or °F?`,
    choices: [
      { value: 'C', label: '°C' },
      { value: 'F', label: `°F (the highest is then ${toCelsius(highest, 'F').toFixed(1)} °C)` },
    ],
  };
}

/** The temperature column, or the question which of several it is; null when there is none. */
export function temperatureColumn(
  table: FoundTable,
  { temperature }: FoundColumns,
  answer: FileAnswers['column'],
): number | FileQuestion | null {
  const [first, ...others] = temperature;
  if (first === undefined) return null;
  if (others.length === 0) return first;
  if (answer !== undefined && temperature.includes(answer)) return answer;
  const choices = temperature.map((i) => ({ value: String(i), label: columnName(table, i) }));
  return { code: 'column', text: 'Several columns may be the temperature at the nest. Which is it?', choices };
}
