import 'server-only';
import {
  type BroodSettings,
  DEFAULT_SETTINGS,
  SETTING_RULES,
  type Setting,
  type SettingName,
} from '@/lib/brood/settings';
import type { SettingsContent } from '@/lib/brood/team-settings/content';
import { latestVersion } from './settings/settings-rows';
import type { TeamScope } from './team-scope';

/** The settings behind an estimate, with the number of the version they are. */
export interface TeamBroodSettings {
  /** 0 while the team runs on the product's defaults. */
  version: number;
  settings: BroodSettings;
}

function isSettingName(name: string): name is SettingName {
  return Object.hasOwn(SETTING_RULES, name);
}

/** The part of a team's settings that the brood model reads. */
export function broodSettingsOf({ values, durations }: SettingsContent, version: string): BroodSettings {
  const own: Record<SettingName, Setting> = { ...DEFAULT_SETTINGS.values };
  for (const [name, setting] of Object.entries(values)) if (isSettingName(name)) own[name] = setting;
  return { version, values: own, durations };
}

/**
 * The team's latest settings version: numbers from `settings_versions.settings` (JSON, `{name: {value, trust, source}}`),
 * durations from `duration_sets`.
 */
export async function teamBroodSettings(scope: TeamScope): Promise<TeamBroodSettings> {
  const { version, content } = await latestVersion(scope);
  if (version === 0) return { version, settings: DEFAULT_SETTINGS };
  return { version, settings: broodSettingsOf(content, String(version)) };
}
