import 'server-only';
import {
  DEFAULT_REVIEW_SETTINGS,
  REVIEW_SETTING_RULES,
  type ReviewSettingName,
  type ReviewSettings,
  fitsReviewRule,
} from '@/lib/comb/review-settings';
import type { TeamScope } from '@/lib/server/queries/team-scope';

/** The numbers the lab's review goes by, with the version of the team's settings they come from. */
export interface TeamReviewSettings {
  /** 0 while the team runs on the product's defaults. */
  version: number;
  values: ReviewSettings;
}

function isReviewName(name: string): name is ReviewSettingName {
  return Object.hasOwn(REVIEW_SETTING_RULES, name);
}

function valueOf(stored: unknown): unknown {
  return stored !== null && typeof stored === 'object' && 'value' in stored ? stored.value : null;
}

/** The review's numbers in a stored version; a name it lacks, or a value that does not fit, keeps the default. */
function storedValues(json: string): ReviewSettings {
  const parsed: unknown = JSON.parse(json);
  const values = { ...DEFAULT_REVIEW_SETTINGS };
  if (parsed === null || typeof parsed !== 'object') return values;
  for (const [name, stored] of Object.entries(parsed)) {
    const value = valueOf(stored);
    if (isReviewName(name) && fitsReviewRule(name, value)) values[name] = value;
  }
  return values;
}

/** The team's latest settings, as far as the lab's review reads them. */
export async function teamReviewSettings({ team, db, transaction }: TeamScope): Promise<TeamReviewSettings> {
  const row = await db.models.SettingsVersion.findOne({
    where: { team_id: team },
    order: [['version', 'DESC']],
    raw: true,
    transaction,
  });
  return row
    ? { version: row.version, values: storedValues(row.settings) }
    : { version: 0, values: DEFAULT_REVIEW_SETTINGS };
}
