import 'server-only';
import type { Role } from '@/lib/server/auth/role';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { idInPath, teamAct } from '@/lib/server/commands/team-act';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { endSessionsIn, memberRole, requireOtherCoordinator } from './member-rows';

/** The person an act was about. */
export interface ChangedMember {
  id: string;
}

/**
 * Gives a member another role; it counts from their next request on.
 *
 * @param text the person's id as it stands in the address.
 * @throws HttpProblem `not-found`, or `last-coordinator`.
 */
export async function changeRole(
  ctx: TeamContext,
  { text, role }: { text: string | undefined; role: Role },
  nowMs: number,
): Promise<ChangedMember> {
  const id = idInPath(text);
  return teamAct(ctx, nowMs, async (transaction) => {
    const from = await memberRole(ctx, id, transaction);
    if (from === 'coordinator' && role !== 'coordinator') await requireOtherCoordinator(ctx, id, transaction);
    const where = { team_id: toBinary(ctx.teamId), user_id: toBinary(id) };
    await database().models.Membership.update({ role }, { where, transaction });
    return { result: { id }, event: { action: 'member.role', subjectId: id, detail: { from, to: role } } };
  });
}

/**
 * Ends a membership: the person's own, or another's for a coordinator. Sign-ins to this team end at once; everything
 * the person recorded stays under their name.
 *
 * @throws HttpProblem `not-found`, or `last-coordinator`.
 */
export async function endMembership(ctx: TeamContext, text: string | undefined, nowMs: number): Promise<ChangedMember> {
  const id = idInPath(text);
  return teamAct(ctx, nowMs, async (transaction) => {
    const role = await memberRole(ctx, id, transaction);
    if (role === 'coordinator') await requireOtherCoordinator(ctx, id, transaction);
    const where = { team_id: toBinary(ctx.teamId), user_id: toBinary(id) };
    await database().models.Membership.update({ ended_at: new Date(nowMs) }, { where, transaction });
    const sessions = await endSessionsIn({ teamId: ctx.teamId, userId: id }, nowMs, transaction);
    return { result: { id }, event: { action: 'member.end', subjectId: id, detail: { role, sessions } } };
  });
}

/**
 * Signs a member out everywhere in this team.
 *
 * @throws HttpProblem `not-found`.
 */
export async function signMemberOut(ctx: TeamContext, text: string | undefined, nowMs: number): Promise<ChangedMember> {
  const id = idInPath(text);
  return teamAct(ctx, nowMs, async (transaction) => {
    await memberRole(ctx, id, transaction);
    const sessions = await endSessionsIn({ teamId: ctx.teamId, userId: id }, nowMs, transaction);
    return { result: { id }, event: { action: 'member.sign-out', subjectId: id, detail: { sessions } } };
  });
}
