import type { DateOrder } from './date-text';
import type { Decimal } from './number-text';
import type { Delimiter } from './split-cells';

/** What a file was recognised as; shown before anything is kept. */
export interface FileLayout {
  kind: 'logger' | 'daily';
  delimiter: Delimiter;
  decimal: Decimal;
  order: DateOrder;
  /** The line with the names of the columns, or null. */
  headerLine: number | null;
  /** Names of the columns used, or their numbers where they have none. */
  columns: { time: string; temperature: string };
  unit: 'C' | 'F';
  /** `file`: the file says it; `person`: somebody said it; `values`: nothing is above 45, so it is read as °C. */
  unitFrom: 'file' | 'person' | 'values';
  /** `local`: the nest's own clocks; otherwise the file gives the distance from UTC. */
  clock: 'local' | 'offset';
}

/** What a person has to say before a file can be read. */
export type FileQuestion =
  | { code: 'date-order'; text: string; choices: { value: 'dmy' | 'mdy'; label: string }[] }
  | { code: 'unit'; text: string; choices: { value: 'C' | 'F'; label: string }[] }
  | { code: 'column'; text: string; choices: { value: string; label: string }[] };

/** What a person said about a file. */
export interface FileAnswers {
  order?: 'dmy' | 'mdy';
  unit?: 'C' | 'F';
  /** The temperature column, counted from 0. */
  column?: number;
}
