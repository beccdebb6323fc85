import 'server-only';
import { agentWords } from '@/lib/server/auth/agent-words';
import { sessionSetCookie } from '@/lib/server/auth/session-cookie';
import { openSessionIn, revokeSession } from '@/lib/server/auth/session-rows';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { HttpProblem } from '@/lib/server/http/problem';
import { accountOwner } from './account-owner';

/**
 * Steps over into another team of one's own: a session belongs to one team, so a new one is opened there and the
 * present one ends.
 *
 * @param team the id of the team.
 * @param agent the `User-Agent` header of the browser.
 * @throws HttpProblem `not-found` for a team the person is not in.
 */
export async function switchTeam(
  ctx: TeamContext,
  { team, agent }: { team: string; agent: string },
  nowMs: number,
): Promise<Response> {
  const owner = await accountOwner(ctx.userId);
  const other = owner?.teams.find(({ id }) => id === team);
  if (!other) throw new HttpProblem('not-found');
  const { userId } = ctx;
  const ref = await openSessionIn(other.id, { userId, agent: agentWords(agent) }, nowMs);
  if (ctx.sessionId !== null) await revokeSession({ teamId: ctx.teamId, sessionId: ctx.sessionId }, nowMs);
  const response = Response.json({ team: { id: other.id, name: other.name } });
  response.headers.append('Set-Cookie', await sessionSetCookie({ userId, ...ref }));
  return response;
}
