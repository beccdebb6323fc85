import { type Result, err, ok } from '@/lib/kit/result';
import type { DurationRow } from '@/lib/brood/durations';
import { type SettingsTrouble, checkContent } from '@/lib/brood/team-settings/check-content';
import {
  type ConfusionRow,
  type ConfusionRows,
  RECORDED_CLASSES,
  TRUE_CLASSES,
  type TrueClass,
} from '@/lib/brood/team-settings/confusion-rows';
import type { DurationFactor, SettingsContent } from '@/lib/brood/team-settings/content';
import { SETTING_ITEMS } from '@/lib/brood/team-settings/setting-groups';
import type { Trust } from '@/lib/brood/trust';

/** Trust and source, as they are edited beside every value. */
export interface Origin {
  trust: Trust;
  source: string;
}

/** One number as it is typed. */
export interface TypedValue extends Origin {
  text: string;
}

/** One row of the confusion as it is typed, a text for each class that can be recorded. */
export interface TypedRow extends Origin {
  shares: Readonly<Record<string, string>>;
}

/** One row of durations as it is typed. */
export interface TypedDurations extends Origin {
  /** Stays the same while the row is edited. */
  key: string;
  taxon: string;
  egg: string;
  larva: string;
  capped: string;
  referenceC: string;
}

/** A draft as it is typed. */
export interface DraftForm {
  values: Readonly<Record<string, TypedValue>>;
  confusion: Readonly<Record<string, TypedRow>>;
  durations: readonly TypedDurations[];
  durationFactors: readonly DurationFactor[];
}

/** A number as it is put into a field, with all its digits. */
const typed = (value: number): string => String(value);

function typedRow(row: ConfusionRow): Record<string, string> {
  return Object.fromEntries(RECORDED_CLASSES.map((seen) => [seen, row[seen] ? typed(row[seen]) : '']));
}

/** Settings as fields to type in. */
export function draftForm({ values, confusion, durations, durationFactors }: SettingsContent): DraftForm {
  return {
    values: Object.fromEntries(
      [...SETTING_ITEMS].map(([name, item]) => {
        const { value, trust, source } = values[name] ?? item.default;
        return [name, { text: typed(value), trust, source }];
      }),
    ),
    confusion: Object.fromEntries(
      TRUE_CLASSES.map((name) => {
        const { row, trust, source } = confusion[name];
        return [name, { shares: typedRow(row), trust, source }];
      }),
    ),
    durations: durations.map(({ taxon, egg, larva, capped, referenceC, trust, source }) => ({
      ...{ key: taxon, taxon, egg: typed(egg), larva: typed(larva), capped: typed(capped) },
      ...{ referenceC: typed(referenceC), trust, source },
    })),
    durationFactors,
  };
}

/** A typed number; NaN for anything else, which the check then names. */
function numberOf(text: string): number {
  const plain = text.trim().replace('−', '-').replace(',', '.');
  return plain === '' ? NaN : Number(plain);
}

function rowOf({ shares, trust, source }: TypedRow) {
  const filled = Object.entries(shares).filter(([, text]) => text.trim() !== '' && numberOf(text) !== 0);
  return { row: Object.fromEntries(filled.map(([seen, text]) => [seen, numberOf(text)])), trust, source };
}

function durationsOf({ taxon, egg, larva, capped, referenceC, trust, source }: TypedDurations): DurationRow {
  return {
    ...{ taxon: taxon.trim(), egg: numberOf(egg), larva: numberOf(larva), capped: numberOf(capped) },
    ...{ referenceC: numberOf(referenceC), trust, source },
  };
}

/** What the fields say, whether it can stand or not. */
function typedContent({ values, confusion, durations, durationFactors }: DraftForm): SettingsContent {
  const rows = Object.entries(confusion).map(([name, row]) => [name, rowOf(row)] as const);
  return {
    values: Object.fromEntries(
      Object.entries(values).map(([name, { text, trust, source }]) => [
        name,
        { value: numberOf(text), trust, source: source.trim() },
      ]),
    ),
    // `draftForm` made a row for every true class.
    confusion: Object.fromEntries(rows) as ConfusionRows,
    durations: durations.map(durationsOf),
    durationFactors,
  };
}

/** Reads the fields, or says everything in them that cannot stand. */
export function readDraftForm(form: DraftForm): Result<SettingsContent, SettingsTrouble[]> {
  const content = typedContent(form);
  const troubles = checkContent(content);
  return troubles.length === 0 ? ok(content) : err(troubles);
}

/** The sum of a typed row, for showing while it is typed. */
export function typedSum({ shares }: TypedRow): number {
  return Object.values(shares).reduce((sum, text) => sum + (text.trim() === '' ? 0 : numberOf(text)), 0);
}

/** The row of one true class in a form. */
export function rowIn(form: DraftForm, name: TrueClass): TypedRow {
  return form.confusion[name] ?? { shares: {}, trust: 'assumption', source: '' };
}
