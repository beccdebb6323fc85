import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/server/db/database';
import { newId } from '@/lib/server/db/new-id';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { SESSION_SECONDS } from './session-cookie';
import type { SessionRef } from './session-id';

/** Who signs in, and in which browser. */
export interface NewSession {
  userId: string;
  /** The browser in words. */
  agent: string;
}

/**
 * The team a person signs in to: of several the one they were last in, else the first by name; null without any.
 * Asked before a team is known, so it looks over all of the person's memberships.
 */
export async function homeTeam(userId: string): Promise<string | null> {
  const rows = await database().sequelize.query<{ teamId: Buffer }>(
    `SELECT m.team_id AS teamId FROM memberships m JOIN teams t ON t.id = m.team_id
     LEFT JOIN (SELECT team_id, MAX(last_seen_at) AS seen FROM sessions WHERE user_id = :user GROUP BY team_id) s
       ON s.team_id = m.team_id
     WHERE m.user_id = :user AND m.ended_at IS NULL ORDER BY s.seen IS NULL, s.seen DESC, t.name, t.id LIMIT 1`,
    { type: QueryTypes.SELECT, replacements: { user: toBinary(userId) } },
  );
  return rows[0] ? fromBinary(rows[0].teamId) : null;
}

/** Writes the row of a new sign-in to a team; the caller has checked the membership. */
export async function openSessionIn(teamId: string, { userId, agent }: NewSession, nowMs: number): Promise<SessionRef> {
  const sessionId = newId();
  await database().models.Session.create({
    team_id: toBinary(teamId),
    id: toBinary(sessionId),
    user_id: toBinary(userId),
    created_at: new Date(nowMs),
    last_seen_at: new Date(nowMs),
    expires_at: new Date(nowMs + SESSION_SECONDS * 1000),
    revoked_at: null,
    agent,
  });
  return { teamId, sessionId };
}

/** Writes the row of a new sign-in; null for a person without a team. */
export async function openSession(session: NewSession, nowMs: number): Promise<SessionRef | null> {
  const teamId = await homeTeam(session.userId);
  return teamId === null ? null : openSessionIn(teamId, session, nowMs);
}

/** Ends a sign-in: the next request with its cookie is refused, wherever the cookie went. */
export async function revokeSession({ teamId, sessionId }: SessionRef, nowMs: number): Promise<void> {
  await database().models.Session.update(
    { revoked_at: new Date(nowMs) },
    { where: { team_id: toBinary(teamId), id: toBinary(sessionId), revoked_at: null } },
  );
}
