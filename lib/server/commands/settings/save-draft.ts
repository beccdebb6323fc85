import 'server-only';
import { checkContent } from '@/lib/brood/team-settings/check-content';
import type { ConfusionRows } from '@/lib/brood/team-settings/confusion-rows';
import { type SettingsContent, contentText } from '@/lib/brood/team-settings/content';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { auditedWrite } from '@/lib/server/commands/audited-write';
import { HttpProblem } from '@/lib/server/http/problem';
import { draftOf, latestVersion } from '@/lib/server/queries/settings/settings-rows';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import type { DraftInput } from './draft-input';

function changed(
  content: SettingsContent,
  { values, confusion, durations, durationFactors }: DraftInput,
): SettingsContent {
  return {
    values: { ...content.values, ...values },
    // Rows come checked for their names only; `checkContent` looks into them.
    confusion: { ...content.confusion, ...confusion } as ConfusionRows,
    durations: durations?.map((row) => ({ ...row, taxon: row.taxon.trim() })) ?? content.durations,
    durationFactors: durationFactors ?? content.durationFactors,
  };
}

/** @throws HttpProblem `settings` with all troubles, one a line, in `detail`. */
export function refuseTroubles(content: SettingsContent): void {
  const troubles = checkContent(content);
  if (troubles.length === 0) return;
  throw new HttpProblem('settings', { members: { detail: troubles.map(({ text }) => text).join('\n') } });
}

async function write(scope: TeamScope, content: SettingsContent, row: { based_on: number; edited_at: Date }) {
  const settings = JSON.stringify({ ...(JSON.parse(contentText(content)) as object), durations: content.durations });
  const { SettingsDraft } = scope.db.models;
  await SettingsDraft.upsert(
    { team_id: scope.team, settings, edited_by: scope.user, ...row },
    { transaction: scope.transaction },
  );
}

/**
 * Changes the team's draft of the settings, or begins one from the version in force. What cannot stand is refused
 * with its reason and changes nothing.
 *
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `settings` with the troubles in words.
 */
export async function saveDraft(ctx: TeamContext, input: DraftInput, nowMs: number): Promise<{ basedOn: number }> {
  return auditedWrite(ctx, nowMs, async (scope) => {
    const draft = await draftOf(scope);
    const { basedOn, content } = draft ?? (await beginning(scope));
    const next = changed(content, input);
    refuseTroubles(next);
    await write(scope, next, { based_on: basedOn, edited_at: new Date(nowMs) });
    return { result: { basedOn }, events: [] };
  });
}

async function beginning(scope: TeamScope): Promise<{ basedOn: number; content: SettingsContent }> {
  const { version, content } = await latestVersion(scope);
  return { basedOn: version, content };
}

/** Throws the team's draft away; the version in force stays. */
export async function discardDraft(ctx: TeamContext, nowMs: number): Promise<{ discarded: boolean }> {
  return auditedWrite(ctx, nowMs, async ({ team, db, transaction }) => {
    const gone = await db.models.SettingsDraft.destroy({ where: { team_id: team }, transaction });
    return { result: { discarded: gone > 0 }, events: [] };
  });
}
