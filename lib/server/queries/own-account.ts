import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { selectRows } from './select-rows';
import { teamScope } from './team-scope';

/** A sign-in of the person who asks. Instants are ISO 8601 UTC. */
export interface SessionAnswer {
  id: string;
  /** The browser in words; blank for a sign-in from before it was written down. */
  agent: string;
  teamName: string;
  createdAt: string;
  lastSeenAt: string;
  /** Is it the one that asks? */
  here: boolean;
}

/** The account of the person who asks. */
export interface AccountAnswer {
  email: string;
  teams: { id: string; name: string; here: boolean }[];
  sessions: SessionAnswer[];
}

interface SessionRow {
  id: Buffer;
  agent: string;
  teamName: string;
  createdAt: Date;
  lastSeenAt: Date;
}

// A person's own sign-ins and teams, so these two look over every team of the person; `:team` only marks the present one.
const SESSIONS = `
  SELECT s.id, s.agent, t.name AS teamName, s.created_at AS createdAt, s.last_seen_at AS lastSeenAt
  FROM sessions s JOIN teams t ON t.id = s.team_id
  JOIN memberships m ON m.team_id = s.team_id AND m.user_id = s.user_id AND m.ended_at IS NULL
  WHERE s.user_id = :user AND s.revoked_at IS NULL AND s.expires_at > :now ORDER BY s.last_seen_at DESC, s.id`;

const TEAMS = `
  SELECT t.id, t.name, t.id = :team AS here FROM memberships m JOIN teams t ON t.id = m.team_id
  WHERE m.user_id = :user AND m.ended_at IS NULL ORDER BY t.name, t.id`;

/**
 * One's own account: e-mail, teams, and where one is signed in.
 *
 * @param nowMs epoch milliseconds.
 */
export async function ownAccount(ctx: TeamContext, nowMs: number): Promise<AccountAnswer> {
  const scope = teamScope(ctx);
  const { user } = scope;
  const account = await scope.db.models.User.findOne({ where: { id: user }, rejectOnEmpty: true });
  const sessions = await selectRows<SessionRow>(scope, SESSIONS, { user, now: new Date(nowMs) });
  const teams = await selectRows<{ id: Buffer; name: string; here: number }>(scope, TEAMS, { user });
  return {
    email: account.email,
    teams: teams.map(({ id, name, here }) => ({ id: fromBinary(id), name, here: Number(here) === 1 })),
    sessions: sessions.map(({ id, agent, teamName, createdAt, lastSeenAt }) => ({
      id: fromBinary(id),
      agent,
      teamName,
      createdAt: createdAt.toISOString(),
      lastSeenAt: lastSeenAt.toISOString(),
      here: fromBinary(id) === ctx.sessionId,
    })),
  };
}
