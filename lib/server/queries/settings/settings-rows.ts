import 'server-only';
import type { InferAttributes } from 'sequelize';
import type { DurationRow } from '@/lib/brood/durations';
import { DEFAULT_CONTENT, type SettingsContent, storedContent } from '@/lib/brood/team-settings/content';
import { isTrust } from '@/lib/brood/trust';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import type { SettingsVersion } from '@/models/settings-version';

/** A signed version as stored. */
type VersionRow = InferAttributes<SettingsVersion>;

/** One version with what it holds. */
export interface VersionContent {
  /** 0 while the team runs on the product's defaults. */
  version: number;
  content: SettingsContent;
  /** Null for the product's defaults. */
  row: VersionRow | null;
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

async function withDurations(scope: TeamScope, row: VersionRow): Promise<VersionContent> {
  const content = storedContent(row.settings, await storedDurations(scope, row.version));
  return { version: row.version, content, row };
}

/** All signed versions of a team, newest first. */
export async function versionRows({ team, db, transaction }: TeamScope): Promise<VersionRow[]> {
  const order: [string, string][] = [['version', 'DESC']];
  return db.models.SettingsVersion.findAll({ where: { team_id: team }, order, raw: true, transaction });
}

/** The version in force; version 0 with the product's defaults when none was ever signed. */
export async function latestVersion(scope: TeamScope): Promise<VersionContent> {
  const row = await scope.db.models.SettingsVersion.findOne({
    where: { team_id: scope.team },
    order: [['version', 'DESC']],
    raw: true,
    transaction: scope.transaction,
  });
  return row ? withDurations(scope, row) : { version: 0, content: DEFAULT_CONTENT, row: null };
}

/** One version of a team; null when there is none of this number. Version 0 is always there. */
export async function versionByNumber(scope: TeamScope, version: number): Promise<VersionContent | null> {
  if (version === 0) return { version: 0, content: DEFAULT_CONTENT, row: null };
  const where = { team_id: scope.team, version };
  const row = await scope.db.models.SettingsVersion.findOne({ where, raw: true, transaction: scope.transaction });
  return row && withDurations(scope, row);
}

/** The draft a team is working on. */
export interface DraftContent {
  basedOn: number;
  content: SettingsContent;
  editedBy: Buffer;
  editedAt: Date;
}

/** The durations inside a draft's text. Only checked rows are ever written there. */
function draftDurations(json: string): DurationRow[] {
  const { durations } = JSON.parse(json) as { durations: DurationRow[] };
  return durations;
}

/** The draft of the team; null when nobody is working on one. */
export async function draftOf({ team, db, transaction }: TeamScope): Promise<DraftContent | null> {
  const row = await db.models.SettingsDraft.findByPk(team, { raw: true, transaction });
  if (!row) return null;
  const content = storedContent(row.settings, draftDurations(row.settings));
  return { basedOn: row.based_on, content, editedBy: row.edited_by, editedAt: row.edited_at };
}
