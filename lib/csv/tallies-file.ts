import { CELL_STATES, STATE_WORDS, type CellState } from '@/lib/comb/states';
import type { Tally } from '@/lib/comb/tally';
import type { CsvColumn, CsvFile } from './column';
import { FIRST_VERSION, READING_KEY_COLUMNS, type ReadingKey } from './shared-columns';

/** Counts by state of one reading. */
export interface TallyRow extends ReadingKey {
  taxon: string | null;
  tally: Tally;
  lockedVersion: number | null;
}

/** Unread cells are counted last, after everything that was seen. */
const COUNTED_STATES: readonly CellState[] = [...CELL_STATES.filter((state) => state !== 'unread'), 'unread'];

const counted = {
  unit: 'cells',
  type: 'integer',
  allowed: '0 or more',
  required: true,
  blankMeans: '',
  since: FIRST_VERSION,
} as const;

/** The column that counts cells in one state. */
function countOf(state: CellState): CsvColumn<TallyRow> {
  return {
    ...counted,
    name: state,
    label: `Cells recorded as ${STATE_WORDS[state]}`,
    value: (row) => row.tally[state],
  };
}

/** `tallies.csv`: one row a reading, final ones included. */
export const TALLIES_FILE: CsvFile<TallyRow> = {
  name: 'tallies.csv',
  columns: [
    ...READING_KEY_COLUMNS,
    {
      name: 'taxon',
      label: 'Scientific name',
      unit: '',
      type: 'free text',
      allowed: 'any text',
      required: false,
      blankMeans: 'not identified',
      since: FIRST_VERSION,
      value: (row) => row.taxon,
    },
    {
      ...counted,
      name: 'cells_total',
      label: 'Cells in the reading, unread ones included; the twelve states add up to it',
      value: (row) => row.tally.cellsTotal,
    },
    ...COUNTED_STATES.map(countOf),
    {
      ...counted,
      name: 'nectar_cells',
      label: 'Cells with stored nectar, counted beside the states',
      value: (row) => row.tally.nectarCells,
    },
    {
      name: 'locked_version',
      label: 'Version of the final reading that is locked',
      unit: '',
      type: 'integer',
      allowed: '1 or more',
      required: false,
      blankMeans: 'not locked yet',
      since: FIRST_VERSION,
      value: (row) => row.lockedVersion,
    },
  ],
};
