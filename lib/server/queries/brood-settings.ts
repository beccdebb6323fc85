import 'server-only';
import { type DurationRow } from '@/lib/brood/durations';
import {
  type BroodSettings,
  DEFAULT_SETTINGS,
  SETTING_RULES,
  type Setting,
  type SettingName,
} from '@/lib/brood/settings';
import { readJsonFile, readObject } from '@/lib/brood/file-fields';
import { readLearnt } from '@/lib/brood/read-settings';
import { isTrust } from '@/lib/brood/trust';
import type { TeamScope } from './team-scope';

/** The settings behind an estimate, with the number of the version they are. */
export interface TeamBroodSettings {
  /** 0 while the team runs on the product's defaults. */
  version: number;
  settings: BroodSettings;
}

/** One stored number; null when it is not a whole setting, so that the default stands in. */
function storedSetting(value: unknown): Setting | null {
  if (value === null || typeof value !== 'object') return null;
  const { value: number, trust, source }: { value?: unknown; trust?: unknown; source?: unknown } = value;
  return typeof number === 'number' && isTrust(trust) && typeof source === 'string'
    ? { value: number, trust, source }
    : null;
}

/** The numbers of a stored version; a name it lacks keeps the product's default. */
function storedValues(json: string): BroodSettings['values'] {
  const parsed: unknown = JSON.parse(json);
  const values: Record<SettingName, Setting> = { ...DEFAULT_SETTINGS.values };
  if (parsed === null || typeof parsed !== 'object') return values;
  for (const [name, value] of Object.entries(parsed)) {
    const setting = storedSetting(value);
    if (setting && isSettingName(name)) values[name] = setting;
  }
  return values;
}

/** What the version has learnt from the team's own data; a member that cannot be read is left out. */
function storedLearnt(json: string): Pick<BroodSettings, 'confusion' | 'durationFactors'> {
  const learnt = readJsonFile(json, (value) => readLearnt(readObject(value, 'settings'), 'settings'));
  return learnt.ok ? learnt.value : {};
}

function isSettingName(name: string): name is SettingName {
  return Object.hasOwn(SETTING_RULES, name);
}

async function storedDurations({ team, db, transaction }: TeamScope, version: number): Promise<DurationRow[]> {
  const where = { team_id: team, version };
  const rows = await db.models.DurationSet.findAll({ where, order: [['taxon', 'ASC']], raw: true, transaction });
  return rows.map(({ taxon, egg_days, larva_days, capped_days, reference_c, trust, source }) => ({
    taxon,
    egg: egg_days,
    larva: larva_days,
    capped: capped_days,
    referenceC: reference_c,
    trust: isTrust(trust) ? trust : 'very low',
    source,
  }));
}

/**
 * The team's latest settings version: numbers from `settings_versions.settings` (JSON, `{name: {value, trust, source}}`),
 * durations from `duration_sets`.
 */
export async function teamBroodSettings(scope: TeamScope): Promise<TeamBroodSettings> {
  const row = await scope.db.models.SettingsVersion.findOne({
    where: { team_id: scope.team },
    order: [['version', 'DESC']],
    raw: true,
    transaction: scope.transaction,
  });
  if (!row) return { version: 0, settings: DEFAULT_SETTINGS };
  const durations = await storedDurations(scope, row.version);
  return {
    version: row.version,
    settings: {
      version: String(row.version),
      values: storedValues(row.settings),
      durations: durations.length > 0 ? durations : DEFAULT_SETTINGS.durations,
      ...storedLearnt(row.settings),
    },
  };
}
