import 'server-only';
import type { SettingsContent } from '@/lib/brood/team-settings/content';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { HttpProblem } from '@/lib/server/http/problem';
import { may } from '@/lib/server/policies/may';
import { type NameOf, memberNames } from '@/lib/server/queries/member-names';
import { teamScope } from '@/lib/server/queries/team-scope';
import {
  type DraftContent,
  type VersionContent,
  draftOf,
  latestVersion,
  versionByNumber,
  versionRows,
} from './settings-rows';

/** A signed version by name, time and reason. */
export interface SignedVersion {
  version: number;
  /** Display name; null for what the team was set up with. */
  signedBy: string | null;
  /** UTC instant; null for the product's defaults. */
  signedAt: string | null;
  reason: string | null;
}

/** A version with what it holds. */
export interface SettingsVersionAnswer extends SignedVersion {
  content: SettingsContent;
}

/** What the lead biologist is working on. */
export interface SettingsDraftAnswer {
  basedOn: number;
  content: SettingsContent;
  editedBy: string;
  editedAt: string;
}

/** The answer of `GET /api/settings`. */
export interface SettingsAnswer extends SettingsVersionAnswer {
  /** Newest first. */
  versions: SignedVersion[];
  /** Only for those who may write settings; null for others and without a draft. */
  draft: SettingsDraftAnswer | null;
}

function signedVersion(row: VersionContent['row'], nameOf: NameOf): SignedVersion {
  if (!row) return { version: 0, signedBy: null, signedAt: null, reason: null };
  const { version, signed_by, signed_at, reason } = row;
  return { version, signedBy: signed_by && nameOf(signed_by), signedAt: signed_at.toISOString(), reason };
}

function presentDraft({ basedOn, content, editedBy, editedAt }: DraftContent, nameOf: NameOf): SettingsDraftAnswer {
  return { basedOn, content, editedBy: nameOf(editedBy), editedAt: editedAt.toISOString() };
}

/** `GET /api/settings`: the version in force, all versions, and the draft for those who may write it. */
export async function settingsAnswer(ctx: TeamContext): Promise<SettingsAnswer> {
  const scope = teamScope(ctx);
  const nameOf = await memberNames(scope);
  const { content, row } = await latestVersion(scope);
  const draft = may(ctx.role, 'settings.write') ? await draftOf(scope) : null;
  return {
    ...signedVersion(row, nameOf),
    content,
    versions: (await versionRows(scope)).map((version) => signedVersion(version, nameOf)),
    draft: draft && presentDraft(draft, nameOf),
  };
}

/**
 * `GET /api/settings/versions/<n>`: one version with what it holds; 0 is the product's defaults.
 *
 * @param number as it stands in the address.
 * @throws HttpProblem `not-found`.
 */
export async function settingsVersion(ctx: TeamContext, number: string): Promise<SettingsVersionAnswer> {
  const scope = teamScope(ctx);
  const found = /^\d{1,9}$/.test(number) ? await versionByNumber(scope, Number(number)) : null;
  if (!found) throw new HttpProblem('not-found');
  return { ...signedVersion(found.row, await memberNames(scope)), content: found.content };
}
