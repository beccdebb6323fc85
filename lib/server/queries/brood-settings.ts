import 'server-only';
import {
  type BroodSettings,
  DEFAULT_SETTINGS,
  SETTING_RULES,
  type Setting,
  type SettingName,
} from '@/lib/brood/settings';
import { type ConfusionRows, DEFAULT_CONFUSION } from '@/lib/brood/team-settings/confusion-rows';
import type { SettingsContent } from '@/lib/brood/team-settings/content';
import type { Trust } from '@/lib/brood/trust';
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

/** Weakest first. */
const TRUST_ORDER: readonly Trust[] = ['assumption', 'very low', 'low', 'medium'];

/** The confusion rows as one matrix with the weakest trust among them; nothing where they are the product's own. */
function ownConfusion(confusion: ConfusionRows, version: string) {
  if (JSON.stringify(confusion) === JSON.stringify(DEFAULT_CONFUSION)) return {};
  const held = Object.entries(confusion);
  const trusts = new Set(held.map(([, { trust }]) => trust));
  const trust = TRUST_ORDER.find((word) => trusts.has(word)) ?? 'assumption';
  const rows = Object.fromEntries(held.map(([name, { row }]) => [name, { ...row }]));
  return { confusion: { rows, trust, source: `settings version ${version}, row by row` } };
}

/** The part of a team's settings that the brood model reads. */
export function broodSettingsOf(content: SettingsContent, version: string): BroodSettings {
  const { values, durations, confusion, durationFactors } = content;
  const own: Record<SettingName, Setting> = { ...DEFAULT_SETTINGS.values };
  for (const [name, setting] of Object.entries(values)) if (isSettingName(name)) own[name] = setting;
  const factors = durationFactors.length > 0 ? { durationFactors } : {};
  return { version, values: own, durations, ...factors, ...ownConfusion(confusion, version) };
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
