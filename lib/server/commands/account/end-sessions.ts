import 'server-only';
import { Op } from 'sequelize';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { idInPath, teamAct } from '@/lib/server/commands/team-act';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';

/** How many sign-ins were ended. */
export interface EndedSessions {
  ended: number;
}

/**
 * Ends one of one's own sign-ins, in whatever team it is.
 *
 * @param text the session's id as it stands in the address.
 * @throws HttpProblem `not-found` for a session that is over or somebody else's.
 */
export async function endOwnSession(ctx: TeamContext, text: string | undefined, nowMs: number): Promise<EndedSessions> {
  const id = idInPath(text);
  return teamAct(ctx, nowMs, async (transaction) => {
    const [ended] = await database().models.Session.update(
      { revoked_at: new Date(nowMs) },
      { where: { user_id: toBinary(ctx.userId), id: toBinary(id), revoked_at: null }, transaction },
    );
    if (ended === 0) throw new HttpProblem('not-found');
    return { result: { ended }, event: { action: 'session.end', subjectId: id, detail: {} } };
  });
}

/** Ends every sign-in of one's own but the one that asks. */
export async function endOtherSessions(ctx: TeamContext, nowMs: number): Promise<EndedSessions> {
  return teamAct(ctx, nowMs, async (transaction) => {
    const [ended] = await database().models.Session.update(
      { revoked_at: new Date(nowMs) },
      {
        where: {
          user_id: toBinary(ctx.userId),
          revoked_at: null,
          ...(ctx.sessionId !== null && { id: { [Op.ne]: toBinary(ctx.sessionId) } }),
        },
        transaction,
      },
    );
    return { result: { ended }, event: { action: 'session.end-others', subjectId: ctx.userId, detail: { ended } } };
  });
}
