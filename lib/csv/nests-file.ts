import type { CsvFile } from './column';
import { FIRST_VERSION, NEST_KEY_COLUMNS, type NestKey } from './shared-columns';

/** One nest. */
export interface NestRow extends NestKey {
  nestId: string;
  name: string | null;
  taxon: string | null;
  lat: number | null;
  lon: number | null;
  accuracyM: number | null;
  openedAt: string;
}

const since = FIRST_VERSION;
const NO_PLACE = 'no place was recorded';

/** `nests.csv`: one row a nest. */
export const NESTS_FILE: CsvFile<NestRow> = {
  name: 'nests.csv',
  columns: [
    ...NEST_KEY_COLUMNS,
    {
      name: 'nest_id',
      label: 'Nest',
      unit: '',
      type: 'uuid',
      allowed: 'lower-case UUID',
      required: true,
      blankMeans: '',
      since,
      value: (row) => row.nestId,
    },
    {
      name: 'name',
      label: 'Name of the nest',
      unit: '',
      type: 'free text',
      allowed: 'any text',
      required: false,
      blankMeans: 'not named',
      since,
      value: (row) => row.name,
    },
    {
      name: 'taxon',
      label: 'Scientific name',
      unit: '',
      type: 'free text',
      allowed: 'any text',
      required: false,
      blankMeans: 'not identified',
      since,
      value: (row) => row.taxon,
    },
    {
      name: 'lat',
      label: 'Latitude of the origin, WGS 84; for some readers the south edge of a 0.01 degree square',
      unit: 'degrees north',
      type: 'decimal',
      allowed: 'from -90 to 90',
      required: false,
      blankMeans: NO_PLACE,
      since,
      value: (row) => row.lat,
    },
    {
      name: 'lon',
      label: 'Longitude of the origin, WGS 84; for some readers the west edge of a 0.01 degree square',
      unit: 'degrees east',
      type: 'decimal',
      allowed: 'from -180 to 180',
      required: false,
      blankMeans: NO_PLACE,
      since,
      value: (row) => row.lon,
    },
    {
      name: 'accuracy_m',
      label: 'Radius the place is accurate to',
      unit: 'm',
      type: 'decimal',
      allowed: '0 or more',
      required: false,
      blankMeans: 'not recorded, or the place is rounded',
      since,
      value: (row) => row.accuracyM,
    },
    {
      name: 'opened_at',
      label: 'When the record of the nest was begun',
      unit: '',
      type: 'date-time',
      allowed: 'ISO 8601 with offset',
      required: true,
      blankMeans: '',
      since,
      value: (row) => row.openedAt,
    },
  ],
};
