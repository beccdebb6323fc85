import { MAX_ADDRESS } from '@/lib/comb/axial';
import { CELL_STATES } from '@/lib/comb/states';
import type { CsvColumn, CsvFile } from './column';
import { FIRST_VERSION, READING_KEY_COLUMNS, type ReadingKey } from './shared-columns';

/** One cell of one reading. */
export interface CellRow extends ReadingKey {
  cell: number;
  q: number;
  r: number;
  state: string;
  instar: number | null;
  nectar: boolean;
  unsure: boolean;
  reused: boolean;
  markedAt: string | null;
  settledFrom: string | null;
}

const always = { unit: '', required: true, blankMeans: '', since: FIRST_VERSION } as const;
const ADDRESS = { ...always, type: 'integer', allowed: `from -${MAX_ADDRESS} to ${MAX_ADDRESS}` } as const;
const MARKED = { ...always, type: 'yes/no', allowed: 'yes | no' } as const;

const PLACE_AND_STATE: readonly CsvColumn<CellRow>[] = [
  {
    ...always,
    name: 'cell',
    label: 'Number of the cell: 0 for the pedicel cell, then ring by ring, clockwise',
    type: 'integer',
    allowed: '0 or more',
    value: (row) => row.cell,
  },
  { ...ADDRESS, name: 'q', label: 'Axial column of the cell; the pedicel cell is 0', value: (row) => row.q },
  { ...ADDRESS, name: 'r', label: 'Axial row of the cell; the pedicel cell is 0', value: (row) => row.r },
  {
    ...always,
    name: 'state',
    label: 'What the cell holds; small, medium and large are larvae',
    type: 'word',
    allowed: CELL_STATES.join(' | '),
    value: (row) => row.state,
  },
  {
    ...always,
    name: 'instar',
    label: 'Larval instar',
    type: 'integer',
    allowed: 'from 1 to 5',
    required: false,
    blankMeans: 'not given',
    value: (row) => row.instar,
  },
  { ...MARKED, name: 'nectar', label: 'Stored nectar is in the cell', value: (row) => row.nectar },
  { ...MARKED, name: 'unsure', label: 'The observer was not sure of the state', value: (row) => row.unsure },
  { ...MARKED, name: 'reused', label: 'New brood in a cell an adult has left', value: (row) => row.reused },
];

/** `cells.csv`: one row a cell of every reading, the archive that tallies are made from. */
export const CELLS_FILE: CsvFile<CellRow> = {
  name: 'cells.csv',
  columns: [
    ...READING_KEY_COLUMNS,
    ...PLACE_AND_STATE,
    {
      ...always,
      name: 'marked_at',
      label: 'When the cell was marked, as the phone showed it; of a settled cell, the mark it replaced',
      type: 'date-time',
      allowed: 'ISO 8601 with offset',
      required: false,
      blankMeans: 'a reviewer added the cell; nobody had marked it',
      value: (row) => row.markedAt,
    },
    {
      ...always,
      name: 'settled_from',
      label: 'The mark that a settled state replaced',
      type: 'uuid',
      allowed: 'lower-case UUID',
      required: false,
      blankMeans: 'the state stands as marked, or nobody had marked the cell',
      value: (row) => row.settledFrom,
    },
  ],
};
