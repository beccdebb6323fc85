import type { CsvColumn, CsvFile, CsvValue } from './column';

/**
 * How a file is written. `exact` holds the recorded characters and nothing else. `spreadsheet` begins with a byte
 * order mark and puts `'` before free text that a spreadsheet would take for a formula, which changes the data.
 */
export type CsvForm = 'exact' | 'spreadsheet';

const BYTE_ORDER_MARK = '\ufeff';
const END_OF_ROW = '\r\n';

/** First characters that make spreadsheets calculate, the full-width forms that some of them fold to these included. */
const STARTS_A_FORMULA = /^[=+\-@\t\r\n\uff1d\uff0b\uff0d\uff20]/;

/** RFC 4180 section 2, rules 6 and 7: commas, quotes and line breaks stand inside quotes. */
const NEEDS_QUOTES = /[",\r\n]/;

/** Spreadsheets in many countries split at semicolons, and some at tabs. */
const NEEDS_QUOTES_IN_SPREADSHEET = /[",;\t\r\n]/;

/** The characters of a value before any quoting. */
function textOf(value: CsvValue): string {
  if (value === null) return '';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  return String(value);
}

/** One field: guarded where the form and the column ask for it, then quoted where RFC 4180 does. */
function field(column: Pick<CsvColumn<never>, 'type'>, value: CsvValue, form: CsvForm): string {
  const plain = textOf(value);
  const guarded = form === 'spreadsheet' && column.type === 'free text' && STARTS_A_FORMULA.test(plain);
  const text = guarded ? `'${plain}` : plain;
  const special = form === 'spreadsheet' ? NEEDS_QUOTES_IN_SPREADSHEET : NEEDS_QUOTES;
  return special.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/** The first line of a file: its column names, after the byte order mark in the spreadsheet form. */
export function writeHeader<Row>(file: CsvFile<Row>, form: CsvForm): string {
  const names = file.columns.map((column) => column.name).join(',');
  return `${form === 'spreadsheet' ? BYTE_ORDER_MARK : ''}${names}${END_OF_ROW}`;
}

/**
 * One row of a file, after RFC 4180: fields quoted only where they must be, CRLF at the end.
 * Null is written as nothing, booleans as yes and no, numbers in their shortest exact form with a decimal point.
 */
export function writeRow<Row>(file: CsvFile<Row>, row: Row, form: CsvForm): string {
  return file.columns.map((column) => field(column, column.value(row), form)).join(',') + END_OF_ROW;
}
