import { DEFAULT_DURATIONS, type DurationRow } from '@/lib/brood/durations';
import type { Setting } from '@/lib/brood/settings';
import { type Trust, isTrust } from '@/lib/brood/trust';
import {
  type ConfusionRow,
  type ConfusionRows,
  DEFAULT_CONFUSION,
  type HeldRow,
  TRUE_CLASSES,
  isRecordedClass,
  rowTrouble,
} from './confusion-rows';
import { SETTING_ITEMS } from './setting-groups';

/** How the nests of a taxon develop relative to its durations, learnt from the team's own: log of the rate. */
export interface DurationFactor {
  /** The taxon of the row of durations it applies to. */
  taxon: string;
  /** Mean of the log rate; above 0 is faster than the durations. */
  logMean: number;
  /** Standard deviation of the log rate from nest to nest, what is not known of the mean included. */
  logSd: number;
  trust: Trust;
  source: string;
}

/** Everything one version of a team's settings holds. */
export interface SettingsContent {
  values: Readonly<Record<string, Setting>>;
  confusion: ConfusionRows;
  durations: readonly DurationRow[];
  durationFactors: readonly DurationFactor[];
}

/** What a team starts with. */
export const DEFAULT_CONTENT: SettingsContent = {
  values: Object.fromEntries([...SETTING_ITEMS].map(([name, item]) => [name, item.default])),
  confusion: DEFAULT_CONFUSION,
  durations: DEFAULT_DURATIONS,
  durationFactors: [],
};

type Members = Readonly<Record<string, unknown>>;

function membersOf(value: unknown): Members {
  return value !== null && typeof value === 'object' && !Array.isArray(value) ? (value as Members) : {};
}

/** One stored number; null when it is not a whole setting, so that the default stands in. */
function storedSetting(value: unknown): Setting | null {
  const { value: number, trust, source } = membersOf(value);
  return typeof number === 'number' && isTrust(trust) && typeof source === 'string'
    ? { value: number, trust, source }
    : null;
}

function storedRow(value: unknown): HeldRow | null {
  const { row, trust, source } = membersOf(value);
  const shares = Object.entries(membersOf(row)).filter(
    (entry): entry is [string, number] => typeof entry[1] === 'number',
  );
  const held: ConfusionRow = Object.fromEntries(shares.filter(([name]) => isRecordedClass(name)));
  if (!isTrust(trust) || typeof source !== 'string' || rowTrouble('', held) !== null) return null;
  return { row: held, trust, source };
}

function storedFactors(value: unknown): DurationFactor[] {
  if (!Array.isArray(value)) return [];
  return value.flatMap((item) => {
    const { taxon, logMean, logSd, trust, source } = membersOf(item);
    const isWhole = typeof taxon === 'string' && typeof logMean === 'number' && typeof logSd === 'number';
    return isWhole && isTrust(trust) && typeof source === 'string' ? [{ taxon, logMean, logSd, trust, source }] : [];
  });
}

/**
 * Reads stored settings: numbers by name and `confusion` by row. What is missing or not whole keeps the product's
 * default, so that an older version can always be read.
 *
 * @param json as written by `contentText`.
 * @param durations stored beside it; the product's rows when there are none.
 */
export function storedContent(json: string, durations: readonly DurationRow[]): SettingsContent {
  const stored = membersOf(JSON.parse(json) as unknown);
  const rows = membersOf(stored.confusion);
  const values = [...SETTING_ITEMS].map(([name, item]) => [name, storedSetting(stored[name]) ?? item.default] as const);
  const confusion = TRUE_CLASSES.map((name) => [name, storedRow(rows[name]) ?? DEFAULT_CONFUSION[name]] as const);
  return {
    values: Object.fromEntries(values),
    confusion: Object.fromEntries(confusion) as ConfusionRows,
    durations: durations.length > 0 ? durations : DEFAULT_DURATIONS,
    durationFactors: storedFactors(stored.durationFactors),
  };
}

/** The text that all but the durations is stored as; those have rows of their own. */
export function contentText({ values, confusion, durationFactors }: SettingsContent): string {
  return JSON.stringify({ ...values, confusion, durationFactors });
}
