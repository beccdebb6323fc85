import { AGREEMENT_FILE } from './agreement-file';
import { CELLS_FILE } from './cells-file';
import type { CsvColumn, CsvFile } from './column';
import { NESTS_FILE } from './nests-file';
import { SETTLEMENTS_FILE } from './settlements-file';
import { FIRST_VERSION } from './shared-columns';
import { TALLIES_FILE } from './tallies-file';
import { VISITS_FILE } from './visits-file';

/** One column of one file, in words. */
export interface DictionaryRow extends Omit<CsvColumn<never>, 'value'> {
  file: string;
}

const always = {
  unit: '',
  type: 'word',
  allowed: 'any text',
  required: true,
  blankMeans: '',
  since: FIRST_VERSION,
} as const;
const sometimes = { ...always, required: false } as const;

/** `dictionary.csv`: one row for every column of every file, itself included. */
export const DICTIONARY_FILE: CsvFile<DictionaryRow> = {
  name: 'dictionary.csv',
  columns: [
    { ...always, name: 'file', label: 'File the column is in', value: (row) => row.file },
    { ...always, name: 'name', label: 'Header of the column', value: (row) => row.name },
    { ...always, name: 'label', label: 'What the column holds', value: (row) => row.label },
    { ...sometimes, name: 'unit', label: 'Unit', blankMeans: 'has no unit', value: (row) => row.unit },
    {
      ...always,
      name: 'type',
      label: "Type; only free text gets a leading ' in the spreadsheet form",
      allowed: 'free text | word | uuid | integer | decimal | date | date-time | yes/no',
      value: (row) => row.type,
    },
    { ...always, name: 'allowed_values', label: 'Values that occur', value: (row) => row.allowed },
    {
      ...always,
      name: 'required',
      label: 'Is the column filled in on every row?',
      type: 'yes/no',
      allowed: 'yes | no',
      value: (row) => row.required,
    },
    {
      ...sometimes,
      name: 'blank_means',
      label: 'What a blank says',
      blankMeans: 'the column is never blank',
      value: (row) => row.blankMeans,
    },
    { ...always, name: 'since', label: 'Version that first wrote the column', value: (row) => row.since },
  ],
};

/** The words about the columns of one file. */
function describe<Row>({ name: file, columns }: CsvFile<Row>): DictionaryRow[] {
  return columns.map(({ value: _, ...words }) => ({ file, ...words }));
}

/** Every row of the dictionary, file by file, in column order. */
export function dictionaryRows(): DictionaryRow[] {
  return [
    ...describe(NESTS_FILE),
    ...describe(VISITS_FILE),
    ...describe(TALLIES_FILE),
    ...describe(CELLS_FILE),
    ...describe(SETTLEMENTS_FILE),
    ...describe(AGREEMENT_FILE),
    ...describe(DICTIONARY_FILE),
  ];
}
