/** What a column holds. Only `free text` was typed by a person and may begin with anything. */
export type CsvType = 'free text' | 'word' | 'uuid' | 'integer' | 'decimal' | 'date' | 'date-time' | 'yes/no';

/** What a cell of a file may be made from; null is blank. */
export type CsvValue = string | number | boolean | null;

/** One column: how it is described to people, and where its value comes from. */
export interface CsvColumn<Row> {
  /** The header: stable, lower case, never renamed. */
  name: string;
  label: string;
  /** Unit of the number, blank for anything that has none. */
  unit: string;
  type: CsvType;
  /** In words: a list, a range or a form. */
  allowed: string;
  /** Is it filled in on every row? */
  required: boolean;
  /** What a blank says; itself blank for a required column. */
  blankMeans: string;
  /** Version of the product that first wrote the column. */
  since: string;
  value: (row: Row) => CsvValue;
}

/** One downloadable file. */
export interface CsvFile<Row> {
  /** With its ending, as in the address it is downloaded from. */
  name: string;
  /** In the order they are written; new columns go at the end. */
  columns: readonly CsvColumn<Row>[];
}
