import type { CsvColumn } from './column';

/** The version of the product that wrote the first files. */
export const FIRST_VERSION = '0.1.0';

/** What every row of a nest's file starts from. */
export interface NestKey {
  team: string;
  nest: string;
}

/** What every row below a visit starts from. */
export interface VisitKey extends NestKey {
  visit: string;
  visitDate: string;
}

const always = { required: true, blankMeans: '', since: FIRST_VERSION, unit: '' } as const;

/** The two columns that say whose nest a row is about. */
export const NEST_KEY_COLUMNS: readonly CsvColumn<NestKey>[] = [
  { ...always, name: 'team', label: 'Programme', type: 'free text', allowed: 'any text', value: (row) => row.team },
  { ...always, name: 'nest', label: 'Nest code', type: 'free text', allowed: 'any text', value: (row) => row.nest },
];

/** The four columns that say which visit a row is about. */
export const VISIT_KEY_COLUMNS: readonly CsvColumn<VisitKey>[] = [
  ...NEST_KEY_COLUMNS,
  { ...always, name: 'visit', label: 'Visit', type: 'uuid', allowed: 'lower-case UUID', value: (row) => row.visit },
  {
    ...always,
    name: 'visit_date',
    label: 'Local date of the visit at the nest',
    type: 'date',
    allowed: 'YYYY-MM-DD',
    value: (row) => row.visitDate,
  },
];

/** What the rows of one reading start from. */
export interface ReadingKey extends VisitKey {
  reading: string;
  readingKind: string;
  observer: string;
}

/** The columns that say which reading a row belongs to, and whose it is. */
export const READING_KEY_COLUMNS: readonly CsvColumn<ReadingKey>[] = [
  ...VISIT_KEY_COLUMNS,
  {
    ...always,
    name: 'reading',
    label: 'Reading',
    type: 'uuid',
    allowed: 'lower-case UUID',
    value: (row) => row.reading,
  },
  {
    ...always,
    name: 'reading_kind',
    label: 'Read at the nest, read again in the lab, or settled',
    type: 'word',
    allowed: 'field | second | final',
    value: (row) => row.readingKind,
  },
  {
    ...always,
    name: 'observer',
    label: 'Who read the comb; of a final reading, who locked or last settled it',
    type: 'free text',
    allowed: 'any text',
    value: (row) => row.observer,
  },
];
