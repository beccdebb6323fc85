import { MAX_ADDRESS } from '@/lib/comb/axial';
import { CELL_STATES } from '@/lib/comb/states';
import type { CsvColumn, CsvFile } from './column';
import { FIRST_VERSION, VISIT_KEY_COLUMNS, type VisitKey } from './shared-columns';

/** One decision of a reviewer about one cell. */
export interface SettlementRow extends VisitKey {
  reading: string;
  source: string;
  cell: number;
  q: number;
  r: number;
  /** Of the reading it is based on and of the first lab reading; null where they have no such cell. */
  fieldState: string | null;
  labState: string | null;
  state: string;
  reason: string;
  settledBy: string;
  settledAt: string;
  version: number;
  settledFrom: string | null;
  lockedVersion: number | null;
}

type Column = CsvColumn<SettlementRow>;

const always = { unit: '', required: true, blankMeans: '', since: FIRST_VERSION } as const;
const ADDRESS = { ...always, type: 'integer', allowed: `from -${MAX_ADDRESS} to ${MAX_ADDRESS}` } as const;
const STATE = { ...always, type: 'word', allowed: CELL_STATES.join(' | ') } as const;
const UUID = { ...always, type: 'uuid', allowed: 'lower-case UUID' } as const;
const VERSION = { ...always, type: 'integer', allowed: '1 or more' } as const;

const WHERE: readonly Column[] = [
  { ...UUID, name: 'reading', label: 'Final reading', value: (row) => row.reading },
  { ...UUID, name: 'source_reading', label: 'Reading the final one is based on', value: (row) => row.source },
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
];

const WHAT: readonly Column[] = [
  {
    ...STATE,
    name: 'field_state',
    label: 'State in the reading the final one is based on',
    required: false,
    blankMeans: 'that reading has no such cell',
    value: (row) => row.fieldState,
  },
  {
    ...STATE,
    name: 'lab_state',
    label: 'State in the first lab reading',
    required: false,
    blankMeans: 'there is no lab reading, or it has no such cell',
    value: (row) => row.labState,
  },
  { ...STATE, name: 'state', label: 'State that was decided', value: (row) => row.state },
  {
    ...always,
    name: 'reason',
    label: 'Why, in the words of who decided',
    type: 'free text',
    allowed: 'any text',
    value: (row) => row.reason,
  },
];

const WHO: readonly Column[] = [
  {
    ...always,
    name: 'settled_by',
    label: 'Who decided',
    type: 'free text',
    allowed: 'any text',
    value: (row) => row.settledBy,
  },
  {
    ...always,
    name: 'settled_at',
    label: 'When it was decided',
    type: 'date-time',
    allowed: 'ISO 8601 with offset',
    value: (row) => row.settledAt,
  },
  { ...VERSION, name: 'version', label: 'Version of the final reading it was made in', value: (row) => row.version },
  {
    ...UUID,
    name: 'settled_from',
    label: 'The mark that the decision replaced',
    required: false,
    blankMeans: 'nobody had marked the cell',
    value: (row) => row.settledFrom,
  },
  {
    ...VERSION,
    name: 'locked_version',
    label: 'Version of the final reading that is locked',
    required: false,
    blankMeans: 'not locked yet',
    value: (row) => row.lockedVersion,
  },
];

/** `settlements.csv`: one row a decision about a cell, in the order they were made. */
export const SETTLEMENTS_FILE: CsvFile<SettlementRow> = {
  name: 'settlements.csv',
  columns: [...VISIT_KEY_COLUMNS, ...WHERE, ...WHAT, ...WHO],
};
