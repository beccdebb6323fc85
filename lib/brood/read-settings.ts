import type { DurationRow } from './durations';
import { FieldError, type Fields, readList, readNumber, readObject, readText } from './file-fields';
import { type BroodSettings, DEFAULT_SETTINGS, SETTING_RULES, type Setting, type SettingName } from './settings';
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
  return {
    value: readNumber(given.value, typeof value === 'number' ? field : `${field}.value`, SETTING_RULES[name]),
    trust: readTrust(given.trust, `${field}.trust`),
    source: readSource(given.source, `${field}.source`),
  };
}

function isSettingName(name: string): name is SettingName {
  return Object.hasOwn(SETTING_RULES, name);
}

/**
 * Reads settings that differ from the defaults: any numbers by name, `durations` rows that go before the built-in
 * ones, and a `version` text. A name that is not a setting is refused, since a slip there would change dates unseen.
 *
 * @throws FieldError naming the member.
 */
export function readSettings(value: unknown, field: string): BroodSettings {
  const given = readObject(value, field);
  const values: Record<SettingName, Setting> = { ...DEFAULT_SETTINGS.values };
  for (const [name, number] of Object.entries(given)) {
    if (name === 'version' || name === 'durations') continue;
    if (!isSettingName(name)) throw new FieldError(`${field}.${name}`, 'is not a setting');
    values[name] = readSetting(number, `${field}.${name}`, name);
  }
  const rows = given.durations === undefined ? [] : readList(given.durations, `${field}.durations`, readRow);
  return {
    version:
      given.version === undefined
        ? `${DEFAULT_SETTINGS.version}, changed`
        : readText(given.version, `${field}.version`),
    values,
    durations: [...rows, ...DEFAULT_SETTINGS.durations],
  };
}
