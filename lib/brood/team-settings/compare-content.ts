import type { DurationRow } from '@/lib/brood/durations';
import type { Trust } from '@/lib/brood/trust';
import { type ConfusionRow, TRUE_CLASSES } from './confusion-rows';
import type { DurationFactor, SettingsContent } from './content';
import { SETTING_ITEMS } from './setting-groups';

/** One thing that differs between two versions. */
export interface SettingsChange {
  field: string;
  label: string;
  before: string;
  after: string;
}

/** A number with the digits a person would write. */
export function numberText(value: number): string {
  return String(Number(value.toPrecision(6)));
}

/** A row of shares, largest first: `egg 0.94, empty 0.05, small 0.01`. */
export function rowText(row: ConfusionRow): string {
  return Object.entries(row)
    .filter(([, share]) => share > 0)
    .sort(([, a], [, b]) => b - a)
    .map(([name, share]) => `${name} ${numberText(share)}`)
    .join(', ');
}

function durationText({ egg, larva, capped, referenceC }: DurationRow): string {
  return `${[egg, larva, capped].map(numberText).join(' / ')} d at ${numberText(referenceC)} °C`;
}

function factorText({ logMean, logSd }: DurationFactor): string {
  return `${numberText(Math.exp(-logMean))} times as long, spread between nests ${numberText(logSd)}`;
}

const held = (text: string, { trust, source }: { trust: Trust; source: string }): string =>
  `${text} (${trust}; ${source})`;

function valueTexts({ values }: SettingsContent): Map<string, [label: string, text: string]> {
  return new Map(
    [...SETTING_ITEMS].map(([name, { label, unit, default: first }]) => {
      const setting = values[name] ?? first;
      return [`values.${name}`, [label, held(`${numberText(setting.value)}${unit && ` ${unit}`}`, setting)]];
    }),
  );
}

function allTexts(content: SettingsContent): Map<string, [label: string, text: string]> {
  const rows = TRUE_CLASSES.map((name) => {
    const { row, ...rest } = content.confusion[name];
    return [`confusion.${name}`, [`confusion, row ${name}`, held(rowText(row), rest)]] as const;
  });
  const durations = content.durations.map(
    (row) => [`durations.${row.taxon}`, [`durations of ${row.taxon}`, held(durationText(row), row)]] as const,
  );
  const factors = content.durationFactors.map(
    (factor) =>
      [`durationFactors.${factor.taxon}`, [`factor for ${factor.taxon}`, held(factorText(factor), factor)]] as const,
  );
  return new Map<string, [string, string]>([
    ...valueTexts(content),
    ...rows.map(([field, [label, text]]) => [field, [label, text]] as [string, [string, string]]),
    ...[...durations, ...factors].map(([field, [label, text]]) => [field, [label, text]] as [string, [string, string]]),
  ]);
}

/** What differs between two settings, in the order of the page. A row that only one has reads `none` in the other. */
export function compareContent(before: SettingsContent, after: SettingsContent): SettingsChange[] {
  const [old, now] = [allTexts(before), allTexts(after)];
  return [...new Set([...old.keys(), ...now.keys()])].flatMap((field) => {
    const [was, is] = [old.get(field), now.get(field)];
    if (was?.[1] === is?.[1]) return [];
    return [{ field, label: (is ?? was)?.[0] ?? field, before: was?.[1] ?? 'none', after: is?.[1] ?? 'none' }];
  });
}
