import 'server-only';
import { type SettingsContent, contentText } from '@/lib/brood/team-settings/content';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { auditedWrite } from '@/lib/server/commands/audited-write';
import { HttpProblem } from '@/lib/server/http/problem';
import { type DraftContent, draftOf, latestVersion } from '@/lib/server/queries/settings/settings-rows';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import { refuseTroubles } from './save-draft';

/** Why, and the version the draft was looked at against. */
interface Signing {
  reason: string;
  basedOn: number;
}

/** The draft, when it may be signed. */
async function signableDraft(scope: TeamScope, basedOn: number): Promise<DraftContent> {
  const draft = await draftOf(scope);
  if (!draft) throw new HttpProblem('no-draft');
  const { version } = await latestVersion(scope);
  if (draft.basedOn !== version || basedOn !== version) throw new HttpProblem('settings-moved');
  refuseTroubles(draft.content);
  return draft;
}

async function writeDurations({ team, db, transaction }: TeamScope, version: number, content: SettingsContent) {
  const rows = content.durations.map(({ taxon, egg, larva, capped, referenceC, trust, source }) => ({
    ...{ team_id: team, version, taxon, trust, source },
    ...{ egg_days: egg, larva_days: larva, capped_days: capped, reference_c: referenceC },
  }));
  await db.models.DurationSet.bulkCreate(rows, { transaction });
}

/**
 * Makes the draft the next version of the team's settings, which can't be changed any more. Estimates made with an
 * earlier version keep its number.
 *
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `no-draft`, `settings-moved` when another version was signed since the draft was begun or
 *   looked at, `settings` when it cannot stand.
 */
export async function signSettings(
  ctx: TeamContext,
  { reason, basedOn }: Signing,
  nowMs: number,
): Promise<{ version: number }> {
  return auditedWrite(ctx, nowMs, async (scope) => {
    const { content } = await signableDraft(scope, basedOn);
    const { team, user, db, transaction } = scope;
    const version = basedOn + 1;
    const signed = { signed_by: user, signed_at: new Date(nowMs), reason };
    await db.models.SettingsVersion.create(
      { team_id: team, version, settings: contentText(content), ...signed },
      { transaction },
    );
    await writeDurations(scope, version, content);
    await db.models.SettingsDraft.destroy({ where: { team_id: team }, transaction });
    return { result: { version }, events: [{ action: 'settings.sign', subjectId: null, detail: { version, reason } }] };
  });
}
