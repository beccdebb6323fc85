import type { Trust } from './trust';

/** Mean stage durations of one taxon in days at the reference nest temperature. */
export interface DurationRow {
  /** Scientific name, or `Polistes` for the genus row that serves every other taxon. */
  taxon: string;
  egg: number;
  larva: number;
  capped: number;
  /** Brood temperature the days refer to, in °C. The sources give none, so it is an assumption. */
  referenceC: number;
  trust: Trust;
  source: string;
  /** The whole time the source prints, where it differs from the sum of its stages. */
  publishedTotal?: number;
}

/** The row that serves a nest, and how it was found. */
export interface DurationChoice {
  row: DurationRow;
  /** `exact`: the taxon has its own row; `genus`: the genus row stands in; `other-genus`: not a *Polistes* at all. */
  match: 'exact' | 'genus' | 'other-genus';
}

const RABB = 'Rabb 1960, Ann Entomol Soc Am 53:111-121';
const SIMILLIMUS = 'Notes on the biology of Polistes simillimus, Bioikos, article 969';

/** 11 / 20 / 14 days, as printed for *exclamans* and called similar for *fuscatus* and *hunteri*. */
const TEMPERATE = { egg: 11, larva: 20, capped: 14, referenceC: 25 };
const SUBTROPICAL = { egg: 10.2, larva: 25.3, capped: 18.7, referenceC: 25, publishedTotal: 51.9 };

const STAND_INS = ['versicolor', 'canadensis', 'lanio'].map((name) => ({
  taxon: `Polistes ${name}`,
  ...SUBTROPICAL,
  trust: 'low' as const,
  source: `no figure of its own; ${SIMILLIMUS} stands in`,
}));

/** The row for every *Polistes* without one of its own. */
export const GENUS_ROW: DurationRow = {
  taxon: 'Polistes',
  ...TEMPERATE,
  trust: 'low',
  source: `no figure of its own; ${RABB} stands in for the genus`,
};

/** The rows the product starts with; a team's lead biologist may replace them. */
export const DEFAULT_DURATIONS: readonly DurationRow[] = [
  { taxon: 'Polistes exclamans', ...TEMPERATE, trust: 'medium', source: RABB },
  { taxon: 'Polistes fuscatus', ...TEMPERATE, trust: 'medium', source: `${RABB} ("similar")` },
  { taxon: 'Polistes hunteri', ...TEMPERATE, trust: 'medium', source: `${RABB} ("similar")` },
  { taxon: 'Polistes simillimus', ...SUBTROPICAL, trust: 'medium', source: SIMILLIMUS },
  ...STAND_INS,
  { ...GENUS_ROW, taxon: 'Polistes humilis', trust: 'very low' },
  GENUS_ROW,
];

/** Splits a name into genus (lower case, `polistes` when left out or shortened) and species words. */
function nameParts(taxon: string): { genus: string; species: string } {
  const words = taxon.trim().toLowerCase().split(/\s+/);
  const [first = '', second = ''] = words;
  if (first === 'polistes' || first === 'p.') return { genus: 'polistes', species: second };
  return words.length > 1 && second !== 'group'
    ? { genus: first, species: second }
    : { genus: 'polistes', species: first };
}

/**
 * Finds the durations for a nest's taxon.
 *
 * @param taxon `Polistes fuscatus`, `P. fuscatus`, `fuscatus`, a group or subgenus name, or null when unknown.
 * @param rows the rows in force; without a `Polistes` row the built-in genus row is the last resort.
 */
export function durationsFor(taxon: string | null, rows: readonly DurationRow[]): DurationChoice {
  const { genus, species } = nameParts(taxon ?? '');
  const byName = (name: string) => rows.find((row) => row.taxon.toLowerCase() === name);
  const fallback = byName('polistes') ?? GENUS_ROW;
  if (genus !== 'polistes') {
    const own = byName(`${genus} ${species}`);
    return own ? { row: own, match: 'exact' } : { row: { ...fallback, trust: 'very low' }, match: 'other-genus' };
  }
  const own = species === '' ? undefined : byName(`polistes ${species}`);
  return own ? { row: own, match: 'exact' } : { row: fallback, match: 'genus' };
}
