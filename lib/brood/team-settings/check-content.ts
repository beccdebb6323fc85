import type { DurationRow } from '@/lib/brood/durations';
import type { Setting } from '@/lib/brood/settings';
import { TRUE_CLASSES, rowTrouble } from './confusion-rows';
import type { DurationFactor, SettingsContent } from './content';
import { SETTING_ITEMS } from './setting-groups';

/** Something in settings that cannot stand, in words that name it. */
export interface SettingsTrouble {
  /** `values.lossEgg`, `confusion.L4`, `durations.Polistes fuscatus`. */
  field: string;
  text: string;
}

/** A stage may last this many days, so that a misplaced point is caught. */
const STAGE_DAYS = { min: 0.5, max: 200 };
const MAX_SOURCE = 200;

function sourceTrouble(source: string): string | null {
  if (source.trim() === '') return 'say where it comes from.';
  return [...source].length > MAX_SOURCE ? `the source is longer than ${MAX_SOURCE} characters.` : null;
}

function valueTroubles([name, { value, source }]: [string, Setting]): SettingsTrouble[] {
  const field = `values.${name}`;
  const item = SETTING_ITEMS.get(name);
  if (!item) return [{ field, text: `${name} is not a setting.` }];
  const { label, min, max, unit, isWhole } = item;
  const isIn = Number.isFinite(value) && value >= min && value <= max;
  const range = isIn ? null : `must be between ${min} and ${max}${unit && ` ${unit}`}.`;
  const whole = isWhole && !Number.isInteger(value) ? 'must be a whole number.' : null;
  return [range, whole, sourceTrouble(source)].flatMap((text) =>
    text ? [{ field, text: `${sentence(label)}: ${text}` }] : [],
  );
}

const sentence = (label: string): string => label.charAt(0).toUpperCase() + label.slice(1);

function durationTroubles(row: DurationRow): SettingsTrouble[] {
  const field = `durations.${row.taxon}`;
  const troubles = (['egg', 'larva', 'capped'] as const).flatMap((stage) => {
    const isIn = row[stage] >= STAGE_DAYS.min && row[stage] <= STAGE_DAYS.max;
    return isIn ? [] : [`${stage} must last between ${STAGE_DAYS.min} and ${STAGE_DAYS.max} days.`];
  });
  const source = sourceTrouble(row.source);
  return [...troubles, ...(source ? [source] : [])].map((text) => ({
    field,
    text: `Durations of ${row.taxon}: ${text}`,
  }));
}

function taxonTroubles(durations: readonly DurationRow[]): SettingsTrouble[] {
  const names = durations.map(({ taxon }) => taxon.trim().toLowerCase());
  const twice = durations.filter(({ taxon }, i) => names.indexOf(taxon.trim().toLowerCase()) !== i);
  const troubles = twice.map(({ taxon }) => ({
    field: `durations.${taxon}`,
    text: `Durations of ${taxon}: the taxon stands there twice.`,
  }));
  if (names.includes('polistes')) return troubles;
  return [
    ...troubles,
    { field: 'durations', text: 'Durations: a row for Polistes is needed; it serves every other taxon.' },
  ];
}

/** Temperatures that contradict each other would leave nothing to be relative to. */
function temperatureTroubles({ values, durations }: SettingsContent): SettingsTrouble[] {
  const [base, plateau, limit] = ['heatBase', 'heatPlateau', 'heatLimit'].map((name) => values[name]?.value ?? NaN);
  const troubles: SettingsTrouble[] = [];
  if (base === undefined || plateau === undefined || limit === undefined) return troubles;
  if (plateau > limit) {
    const text = `No development above ${limit} °C: must not lie below the ${plateau} °C above which it is no faster.`;
    troubles.push({ field: 'values.heatLimit', text });
  }
  for (const { taxon, referenceC } of durations) {
    if (referenceC > base && referenceC <= plateau) continue;
    const text = `Durations of ${taxon}: ${referenceC} °C must lie above ${base} °C and not above ${plateau} °C.`;
    troubles.push({ field: `durations.${taxon}`, text });
  }
  return troubles;
}

/** Development twice or half as fast as published is as far as a team's own nests are believed. */
const FACTOR = { logMean: Math.log(2), logSd: 1 };

function factorTroubles(factors: readonly DurationFactor[]): SettingsTrouble[] {
  return factors.flatMap(({ taxon, logMean, logSd, source }, i) => {
    const isTwice = factors.findIndex((other) => other.taxon === taxon) !== i;
    const texts = [
      Math.abs(logMean) <= FACTOR.logMean ? null : 'must lie between half and twice as fast.',
      logSd >= 0 && logSd <= FACTOR.logSd ? null : `the spread between nests must be between 0 and ${FACTOR.logSd}.`,
      isTwice ? 'stands there twice.' : null,
      sourceTrouble(source),
    ];
    const field = `durationFactors.${taxon}`;
    return texts.flatMap((text) => (text ? [{ field, text: `Factor for ${taxon}: ${text}` }] : []));
  });
}

/** Everything in settings that cannot stand; empty when they can be signed. */
export function checkContent(content: SettingsContent): SettingsTrouble[] {
  const rows = TRUE_CLASSES.flatMap((name) => {
    const { row, source } = content.confusion[name];
    const wrong = sourceTrouble(source);
    const text = rowTrouble(name, row) ?? (wrong && `Confusion, row ${name}: ${wrong}`);
    return text ? [{ field: `confusion.${name}`, text }] : [];
  });
  return [
    ...Object.entries(content.values).flatMap(valueTroubles),
    ...rows,
    ...content.durations.flatMap(durationTroubles),
    ...taxonTroubles(content.durations),
    ...temperatureTroubles(content),
    ...factorTroubles(content.durationFactors),
  ];
}
