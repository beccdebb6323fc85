import 'server-only';
import type { Transaction } from 'sequelize';
import { isRole } from '@/lib/server/auth/role';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { idInPath, teamAct } from '@/lib/server/commands/team-act';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { sendLetter } from '@/lib/server/mail/send-letter';
import type { Invitation } from '@/models/invitation';
import { type Invited, countInvitation } from './invite-member';
import { freshLink, noteInvitation } from './write-invitation';

/** The team's invitation of this id, unanswered and not withdrawn. @throws HttpProblem `not-found`, `link-closed` */
async function standing(ctx: TeamContext, id: string, transaction: Transaction): Promise<Invitation> {
  const where = { team_id: toBinary(ctx.teamId), id: toBinary(id) };
  const row = await database().models.Invitation.findOne({ where, transaction });
  if (!row) throw new HttpProblem('not-found');
  if (row.accepted_at !== null || row.withdrawn_at !== null) throw new HttpProblem('link-closed');
  return row;
}

/**
 * Sends an invitation again with a new link; the link before stops working.
 *
 * @param text the invitation's id as it stands in the address.
 * @throws HttpProblem `not-found`, `link-closed` when it was answered or withdrawn, or `too-many`.
 */
export async function renewInvitation(ctx: TeamContext, text: string | undefined, nowMs: number): Promise<Invited> {
  const id = idInPath(text);
  await countInvitation(ctx, nowMs);
  const noted = await teamAct(ctx, nowMs, async (transaction) => {
    const row = await standing(ctx, id, transaction);
    if (!isRole(row.role)) throw new HttpProblem('link-closed');
    const link = freshLink(nowMs);
    await row.update({ token_hash: link.hash, expires_at: link.expiresAt }, { transaction });
    const team = { id: ctx.teamId, name: ctx.teamName, zone: ctx.zone };
    const { email, role } = row;
    const note = { team, inviter: ctx.displayName, invitationId: id, email, role, link, nowMs };
    const result = await noteInvitation(note, transaction);
    return { result, event: { action: 'member.invite-again', subjectId: id, detail: { role } } };
  });
  return { id, letter: await sendLetter(noted) };
}

/**
 * Takes an invitation back: its link stops working at once.
 *
 * @throws HttpProblem `not-found`, or `link-closed` when it was answered or withdrawn before.
 */
export async function withdrawInvitation(
  ctx: TeamContext,
  text: string | undefined,
  nowMs: number,
): Promise<{ id: string }> {
  const id = idInPath(text);
  return teamAct(ctx, nowMs, async (transaction) => {
    const row = await standing(ctx, id, transaction);
    await row.update({ withdrawn_at: new Date(nowMs) }, { transaction });
    return { result: { id }, event: { action: 'member.withdraw-invite', subjectId: id, detail: {} } };
  });
}
