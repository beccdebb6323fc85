import type { DurationRow } from './durations';
import { FieldError, type Fields, readList, readNumber, readObject, readText, readWhole } from './file-fields';
import { ConfusionError, checkConfusion } from './hmm/emission';
import { CELL_CLASSES, DEFAULT_CONFUSION, RECORDED_CLASSES } from './nest-model/confusion';
import {
  type BroodSettings,
  DEFAULT_SETTINGS,
  type DurationFactor,
  type HeldConfusion,
  SETTING_RULES,
  type Setting,
  type SettingName,
  type SettingRule,
} from './settings';
import { isTrust, type Trust } from './trust';

/** A stage may last this many days, so that a misplaced point is caught. */
const DAYS = { min: 0.5, max: 200 };

function readTrust(value: unknown, field: string): Trust {
  if (value === undefined) return 'assumption';
  if (!isTrust(value)) throw new FieldError(field, 'must be medium, low, very low or assumption');
  return value;
}

function readSource(value: unknown, field: string): string {
  return value === undefined ? 'given with the input' : readText(value, field);
}

function readRow(value: unknown, field: string): DurationRow {
  const row = readObject(value, field);
  return {
    taxon: readText(row.taxon, `${field}.taxon`),
    egg: readNumber(row.egg, `${field}.egg`, DAYS),
    larva: readNumber(row.larva, `${field}.larva`, DAYS),
    capped: readNumber(row.capped, `${field}.capped`, DAYS),
    referenceC:
      row.referenceC === undefined ? 25 : readNumber(row.referenceC, `${field}.referenceC`, { min: 0, max: 50 }),
    trust: readTrust(row.trust, `${field}.trust`),
    source: readSource(row.source, `${field}.source`),
  };
}

/** Reads one number of the model: bare, or with its trust and source. */
function readSetting(value: unknown, field: string, name: SettingName): Setting {
  const given: Fields = typeof value === 'number' ? { value } : readObject(value, field);
  const rule: SettingRule = SETTING_RULES[name];
  const read = rule.isWhole ? readWhole : readNumber;
  return {
    value: read(given.value, typeof value === 'number' ? field : `${field}.value`, rule),
    trust: readTrust(given.trust, `${field}.trust`),
    source: readSource(given.source, `${field}.source`),
  };
}

function isSettingName(name: string): name is SettingName {
  return Object.hasOwn(SETTING_RULES, name);
}

/** Members of the settings that are not single numbers. */
const LISTS: ReadonlySet<string> = new Set(['version', 'durations', 'confusion', 'durationFactors']);

/** Reads a confusion matrix; rows that are not given keep the built-in ones. */
function readConfusion(value: unknown, field: string): HeldConfusion {
  const given = readObject(value, field);
  const rows: Record<string, Record<string, number>> = {};
  for (const [name, row] of Object.entries(readObject(given.rows, `${field}.rows`))) {
    const at = `${field}.rows.${name}`;
    if (!Object.hasOwn(CELL_CLASSES, name))
      throw new FieldError(at, `is not among ${Object.keys(CELL_CLASSES).join(', ')}`);
    const entries = Object.entries(readObject(row, at)).map(([seen, p]) => {
      if (!RECORDED_CLASSES.some((known) => known === seen))
        throw new FieldError(`${at}.${seen}`, `is not among ${RECORDED_CLASSES.join(', ')}`);
      return [seen, readNumber(p, `${at}.${seen}`, { min: 0, max: 1 })] as const;
    });
    rows[name] = Object.fromEntries(entries);
  }
  const whole = { ...DEFAULT_CONFUSION, ...rows };
  try {
    checkConfusion(whole, Object.keys(CELL_CLASSES));
  } catch (error) {
    if (error instanceof ConfusionError) throw new FieldError(`${field}.rows.${error.row}`, error.message);
    throw error;
  }
  return {
    rows: whole,
    trust: readTrust(given.trust, `${field}.trust`),
    source: readSource(given.source, `${field}.source`),
  };
}

function readFactor(value: unknown, field: string): DurationFactor {
  const row = readObject(value, field);
  return {
    taxon: readText(row.taxon, `${field}.taxon`),
    logMean: readNumber(row.logMean, `${field}.logMean`, { min: -1.5, max: 1.5 }),
    logSd: readNumber(row.logSd, `${field}.logSd`, { min: 0, max: 1 }),
    trust: readTrust(row.trust, `${field}.trust`),
    source: readSource(row.source, `${field}.source`),
  };
}

/**
 * Reads what a team has learnt from its own data: `confusion` `{rows, trust?, source?}` and `durationFactors`.
 *
 * @throws FieldError naming the member.
 */
function readLearnt(given: Fields, field: string): Pick<BroodSettings, 'confusion' | 'durationFactors'> {
  return {
    ...(given.confusion == null ? {} : { confusion: readConfusion(given.confusion, `${field}.confusion`) }),
    ...(given.durationFactors == null
      ? {}
      : { durationFactors: readList(given.durationFactors, `${field}.durationFactors`, readFactor) }),
  };
}

/** The reference of every row has to have a rate to be 1 at. */
function checkReferences({ values, durations }: Pick<BroodSettings, 'values' | 'durations'>, field: string): void {
  const [base, plateau] = [values.heatBase.value, values.heatPlateau.value];
  for (const { taxon, referenceC } of durations) {
    if (referenceC > base && referenceC <= plateau) continue;
    const words = `puts ${referenceC} °C for ${taxon} outside development, which runs from above ${base} to ${plateau} °C`;
    throw new FieldError(field, words);
  }
}

/**
 * Reads settings that differ from the defaults: any numbers by name, `durations` rows that go before the built-in
 * ones, what was learnt (`confusion`, `durationFactors`), and a `version` text. A name that is not a setting is
 * refused, since a slip there would change dates unseen.
 *
 * @throws FieldError naming the member.
 */
export function readSettings(value: unknown, field: string): BroodSettings {
  const given = readObject(value, field);
  const values: Record<SettingName, Setting> = { ...DEFAULT_SETTINGS.values };
  for (const [name, number] of Object.entries(given)) {
    if (LISTS.has(name)) continue;
    if (!isSettingName(name)) throw new FieldError(`${field}.${name}`, 'is not a setting');
    values[name] = readSetting(number, `${field}.${name}`, name);
  }
  const rows = given.durations === undefined ? [] : readList(given.durations, `${field}.durations`, readRow);
  const durations = [...rows, ...DEFAULT_SETTINGS.durations];
  checkReferences({ values, durations }, field);
  return {
    version:
      given.version === undefined
        ? `${DEFAULT_SETTINGS.version}, changed`
        : readText(given.version, `${field}.version`),
    values,
    durations,
    ...readLearnt(given, field),
  };
}
