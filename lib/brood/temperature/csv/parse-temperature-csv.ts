import { localInstants } from '@/lib/brood/temperature/local-instants';
import type { TemperatureRecord } from '@/lib/brood/temperature/record';
import { columnName, decimalOf, orderOf, temperatureColumn, unitOf } from './ask-about';
import type { FileNote } from './file-note';
import { type FoundColumns, findColumns } from './find-columns';
import { type FoundTable, findTable } from './find-table';
import type { FileAnswers, FileLayout, FileQuestion } from './layout';
import { type ReadingRules, momentOf } from './read-lines';
import { readDaily } from './read-daily';
import { readLogger } from './read-logger';

/** Longest file that is read, in lines: a season in steps of a minute. */
const MAX_LINES = 400_000;

/** What came of a file. */
export type TemperatureCsv =
  | { kind: 'unreadable'; reason: string }
  | { kind: 'questions'; questions: FileQuestion[] }
  | { kind: 'read'; layout: FileLayout; record: TemperatureRecord; notes: FileNote[] };

/** A table with its columns, before anything is asked. */
interface Opened {
  table: FoundTable;
  columns: FoundColumns;
  /** Columns that hold temperatures: one, or the lowest and the highest of a day. */
  values: { column: number } | { min: number; max: number };
}

const unreadable = (reason: string): { kind: 'unreadable'; reason: string } => ({ kind: 'unreadable', reason });

/** Dates without a time, or with midnight on every line. */
function isDaily(table: FoundTable, columns: FoundColumns): boolean {
  return table.body.every((line) => !momentOf(line, columns)?.timeMs);
}

function chooseValues(table: FoundTable, columns: FoundColumns, answer: FileAnswers['column']) {
  if (columns.extremes && isDaily(table, columns)) return columns.extremes;
  const column = temperatureColumn(table, columns, answer);
  return typeof column === 'number' ? { column } : column;
}

/** Finds table and columns; a question or a reason instead where that is not enough. */
function open(text: string, answers: FileAnswers): Opened | FileQuestion | { kind: 'unreadable'; reason: string } {
  const table = findTable(text);
  if (!table) return unreadable('No line holds a date and a temperature in cells of their own.');
  if (table.body.length > MAX_LINES) return unreadable(`The file has more than ${MAX_LINES} lines.`);
  const columns = findColumns(table);
  if (!columns) return unreadable('No column holds dates on most of its lines.');
  const values = chooseValues(table, columns, answers.column);
  if (values === null) return unreadable('No column holds temperatures on most of its lines.');
  return 'code' in values ? values : { table, columns, values };
}

/** Reads the lines once every question has its answer. */
function readAll(
  { table, columns, values }: Opened,
  rules: ReadingRules,
  unitFrom: FileLayout['unitFrom'],
): TemperatureCsv {
  const { order, decimal, unit } = rules;
  const first = table.body.map((line) => momentOf(line, columns)).find((moment) => moment !== null);
  const hasOffset = (first?.offsetMinutes ?? columns.offsetMinutes) !== null;
  const parts =
    'column' in values
      ? { kind: 'logger' as const, temperature: columnName(table, values.column) }
      : { kind: 'daily' as const, temperature: `${columnName(table, values.min)}, ${columnName(table, values.max)}` };
  const time = [columns.date, ...(columns.time === null ? [] : [columns.time])];
  const layout: FileLayout = {
    ...{ kind: parts.kind, delimiter: table.delimiter, decimal, order, unit, unitFrom },
    headerLine: table.header?.number ?? null,
    columns: { time: time.map((i) => columnName(table, i)).join(', '), temperature: parts.temperature },
    clock: hasOffset ? 'offset' : 'local',
  };
  if ('column' in values) {
    const { values: readings, notes } = readLogger(table.body, rules, values.column);
    return { kind: 'read', layout, record: { kind: 'logger', readings }, notes };
  }
  const { values: days, notes } = readDaily(table.body, rules, values);
  return { kind: 'read', layout, record: { kind: 'daily', days }, notes };
}

/** How many values a record has. */
export function recordSize(record: TemperatureRecord): number {
  return record.kind === 'logger' ? record.readings.length : record.days.length;
}

/**
 * Reads the text of a temperature file: a logger's readings, or lowest and highest of each day. Delimiter, decimal
 * sign, columns, unit and the order of dates are recognised; what the file leaves open is asked, not guessed.
 *
 * @param zone the nest's zone, for times without an offset.
 * @param answers what a person has said about the file so far.
 */
export function parseTemperatureCsv(text: string, zone: string, answers: FileAnswers = {}): TemperatureCsv {
  const opened = open(text, answers);
  if ('kind' in opened) return opened;
  if ('code' in opened) return { kind: 'questions', questions: [opened] };
  const { table, columns, values } = opened;
  const [column, ...rest] = 'column' in values ? [values.column] : [values.min, values.max];
  const decimal = decimalOf(table, [column ?? 0, ...rest]);
  const order = orderOf(table, columns, answers.order);
  if (order === null) return unreadable('Some dates can only have the day first and others only the month first.');
  const unit = unitOf(table, { columns, column: rest[0] ?? column ?? 0, decimal }, answers.unit);
  const questions = [order, unit].filter((part): part is FileQuestion => typeof part === 'object' && 'code' in part);
  if (typeof order !== 'string' || 'code' in unit) return { kind: 'questions', questions };
  const rules: ReadingRules = { columns, order, decimal, unit: unit.unit, instants: localInstants(zone) };
  const read = readAll(opened, rules, unit.unitFrom);
  if (read.kind !== 'read' || recordSize(read.record) > 0) return read;
  return unreadable(read.notes[0]?.text ?? 'No line could be read.');
}
