import 'server-only';
import { QueryTypes, type Transaction } from 'sequelize';
import { isUuidText } from '@/lib/kit/uuid';
import { type Role, isRole } from '@/lib/server/auth/role';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';

/**
 * The role of a present member of the team.
 *
 * @throws HttpProblem `not-found` for everybody else, former members included.
 */
export async function memberRole(ctx: TeamContext, userId: string, transaction: Transaction): Promise<Role> {
  const where = { team_id: toBinary(ctx.teamId), user_id: toBinary(userId), ended_at: null };
  const row = isUuidText(userId) ? await database().models.Membership.findOne({ where, transaction }) : null;
  if (!row || !isRole(row.role)) throw new HttpProblem('not-found');
  return row.role;
}

/**
 * Makes sure that somebody else would still coordinate the team. Asked inside the transaction that holds the team's
 * counter, so two coordinators can't step down at once.
 *
 * @throws HttpProblem `last-coordinator` when nobody would.
 */
export async function requireOtherCoordinator(
  ctx: TeamContext,
  userId: string,
  transaction: Transaction,
): Promise<void> {
  const rows = await database().sequelize.query<{ others: number }>(
    `SELECT COUNT(*) AS others FROM memberships m JOIN users u ON u.id = m.user_id
     WHERE m.team_id = ? AND m.user_id <> ? AND m.role = 'coordinator' AND m.ended_at IS NULL
       AND u.disabled_at IS NULL`,
    { type: QueryTypes.SELECT, replacements: [toBinary(ctx.teamId), toBinary(userId)], transaction },
  );
  if (Number(rows[0]?.others ?? 0) === 0) throw new HttpProblem('last-coordinator');
}

/** Ends every sign-in of a person in the team; the next request of each is refused. */
export async function endSessionsIn(
  { teamId, userId }: { teamId: string; userId: string },
  nowMs: number,
  transaction: Transaction,
): Promise<number> {
  const [count] = await database().models.Session.update(
    { revoked_at: new Date(nowMs) },
    { where: { team_id: toBinary(teamId), user_id: toBinary(userId), revoked_at: null }, transaction },
  );
  return count;
}
