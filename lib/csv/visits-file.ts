import type { CsvFile } from './column';
import { FIRST_VERSION, VISIT_KEY_COLUMNS, type VisitKey } from './shared-columns';

/** One visit to a nest. */
export interface VisitRow extends VisitKey {
  purpose: string;
  startedAt: string;
  readings: number;
}

const always = { unit: '', required: true, blankMeans: '', since: FIRST_VERSION } as const;

/** `visits.csv`: one row a visit. */
export const VISITS_FILE: CsvFile<VisitRow> = {
  name: 'visits.csv',
  columns: [
    ...VISIT_KEY_COLUMNS,
    {
      ...always,
      name: 'purpose',
      label: 'What the visit was for',
      type: 'word',
      allowed: 'take-down | check | lab | other',
      value: (row) => row.purpose,
    },
    {
      ...always,
      name: 'started_at',
      label: 'When the visit began',
      type: 'date-time',
      allowed: 'ISO 8601 with offset',
      value: (row) => row.startedAt,
    },
    {
      ...always,
      name: 'readings',
      label: 'Readings of the comb made at this visit, the final one included',
      unit: 'readings',
      type: 'integer',
      allowed: '0 or more',
      value: (row) => row.readings,
    },
  ],
};
