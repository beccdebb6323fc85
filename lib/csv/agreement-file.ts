import type { CsvColumn, CsvFile } from './column';
import { FIRST_VERSION, VISIT_KEY_COLUMNS, type VisitKey } from './shared-columns';

/** How far two readings of one comb agree. Null is a figure that is undefined. */
export interface AgreementRow extends VisitKey {
  comparison: string;
  firstReading: string;
  firstObserver: string;
  secondReading: string;
  secondObserver: string;
  compared: number;
  unread: number;
  onlyFirst: number;
  onlySecond: number;
  agreed: number;
  raw: number | null;
  rawLow: number;
  rawHigh: number;
  kappa: number | null;
  kappaLow: number | null;
  kappaHigh: number | null;
  stages: number;
  kappaLinear: number | null;
  kappaQuadratic: number | null;
  alphaNominal: number | null;
  alphaOrdinal: number | null;
}

type Column = CsvColumn<AgreementRow>;

const always = { unit: '', required: true, blankMeans: '', since: FIRST_VERSION } as const;

function id(name: string, label: string, value: Column['value']): Column {
  return { ...always, name, label, type: 'uuid', allowed: 'lower-case UUID', value };
}

function person(name: string, label: string, value: Column['value']): Column {
  return { ...always, name, label, type: 'free text', allowed: 'any text', value };
}

function count(name: string, label: string, value: Column['value']): Column {
  return { ...always, name, label, unit: 'cells', type: 'integer', allowed: '0 or more', value };
}

function share(name: string, label: string, value: Column['value']): Column {
  const blankMeans = 'no cell could be compared';
  return { ...always, name, label, type: 'decimal', allowed: 'from 0 to 1', required: false, blankMeans, value };
}

function figure(name: string, label: string, value: Column['value']): Column {
  const blankMeans = 'undefined: no cell could be compared, or both used one word throughout';
  return { ...always, name, label, type: 'decimal', allowed: 'from -1 to 1', required: false, blankMeans, value };
}

const WHO: readonly Column[] = [
  {
    ...always,
    name: 'comparison',
    label: 'Two field readings; field with lab; the lab reading with one by another reader, or with one by the same',
    type: 'word',
    allowed: 'field-field | field-lab | other-reader | same-reader',
    value: (row) => row.comparison,
  },
  id('first_reading', 'First reading: gives the rows of the comparison', (row) => row.firstReading),
  person('first_observer', 'Who made the first reading', (row) => row.firstObserver),
  id('second_reading', 'Second reading', (row) => row.secondReading),
  person('second_observer', 'Who made the second reading', (row) => row.secondObserver),
];

const COUNTS: readonly Column[] = [
  count('cells_compared', 'Cells that both have judged', (row) => row.compared),
  count('cells_unread', 'Cells left out because one or both left them unread', (row) => row.unread),
  count('cells_only_first', 'Cells left out because only the first reading has them', (row) => row.onlyFirst),
  count('cells_only_second', 'Cells left out because only the second reading has them', (row) => row.onlySecond),
  count('cells_agreed', 'Compared cells with the same state in both', (row) => row.agreed),
];

/** Only large samples have these limits. */
function limit(name: string, label: string, value: Column['value']): Column {
  const blankMeans = 'fewer than 50 cells were compared, or kappa is undefined or 1';
  return { ...figure(name, label, value), blankMeans };
}

const FIGURES: readonly Column[] = [
  share('raw', 'Raw agreement: agreed over compared', (row) => row.raw),
  share('raw_low', 'Lower 95 % limit of the raw agreement (Wilson)', (row) => row.rawLow),
  share('raw_high', 'Upper 95 % limit of the raw agreement (Wilson)', (row) => row.rawHigh),
  figure('kappa', "Cohen's kappa over all states", (row) => row.kappa),
  limit('kappa_low', 'Lower 95 % limit of kappa, from its large-sample variance', (row) => row.kappaLow),
  limit('kappa_high', 'Upper 95 % limit of kappa, from its large-sample variance', (row) => row.kappaHigh),
  count('cells_stages', 'Compared cells that both read as egg, larva or capped', (row) => row.stages),
  figure('kappa_linear', 'Kappa over those stages, linear weights', (row) => row.kappaLinear),
  figure('kappa_quadratic', 'Kappa over those stages, quadratic weights', (row) => row.kappaQuadratic),
  figure('alpha_nominal', "Krippendorff's alpha over all states", (row) => row.alphaNominal),
  figure('alpha_ordinal', "Krippendorff's alpha over those stages, ordinal", (row) => row.alphaOrdinal),
];

/** `agreement.csv`: one row a comparison of two submitted readings of one visit. */
export const AGREEMENT_FILE: CsvFile<AgreementRow> = {
  name: 'agreement.csv',
  columns: [...VISIT_KEY_COLUMNS, ...WHO, ...COUNTS, ...FIGURES],
};
