import 'server-only';
import { database } from '@/lib/server/db/database';
import { newId } from '@/lib/server/db/new-id';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { SESSION_SECONDS } from './session-cookie';
import type { SessionRef } from './session-id';

/** The team a person signs in to: with several memberships, the first by team name; null without any. */
export async function homeTeam(userId: string): Promise<string | null> {
  const { Membership, Team } = database().models;
  const memberships = await Membership.findAll({ where: { user_id: toBinary(userId) } });
  if (memberships.length === 0) return null;
  const team = await Team.findOne({ where: { id: memberships.map((row) => row.team_id) }, order: ['name', 'id'] });
  return team && fromBinary(team.id);
}

/** Writes the row of a new sign-in. */
export async function openSession(userId: string, nowMs: number): Promise<SessionRef | null> {
  const teamId = await homeTeam(userId);
  if (!teamId) return null;
  const sessionId = newId();
  await database().models.Session.create({
    team_id: toBinary(teamId),
    id: toBinary(sessionId),
    user_id: toBinary(userId),
    created_at: new Date(nowMs),
    last_seen_at: new Date(nowMs),
    expires_at: new Date(nowMs + SESSION_SECONDS * 1000),
    revoked_at: null,
  });
  return { teamId, sessionId };
}

/** Ends a sign-in: the next request with its cookie is refused, wherever the cookie went. */
export async function revokeSession({ teamId, sessionId }: SessionRef, nowMs: number): Promise<void> {
  await database().models.Session.update(
    { revoked_at: new Date(nowMs) },
    { where: { team_id: toBinary(teamId), id: toBinary(sessionId), revoked_at: null } },
  );
}
