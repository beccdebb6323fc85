import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/server/db/database';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { MEMBER_COLUMNS, type MemberRow, contextOfRow } from './member-row';
import { SESSION_SECONDS } from './session-cookie';
import type { SessionRef } from './session-id';
import type { TeamContext } from './team-context';

/** Use of a session is written down at most this often. */
const SEEN_EVERY_MS = 10 * 60_000;

interface SessionRow extends MemberRow {
  userId: Buffer;
  lastSeenAt: Date;
}

/**
 * Who a session belongs to, read from the database each time: a session that was ended or ran out, a disabled
 * account and an ended membership all give null, and a changed role counts at once.
 *
 * @param nowMs epoch milliseconds.
 */
export async function loadSession(ref: SessionRef, nowMs: number): Promise<TeamContext | null> {
  const rows = await database().sequelize.query<SessionRow>(
    `SELECT s.user_id AS userId, s.last_seen_at AS lastSeenAt, ${MEMBER_COLUMNS}
     FROM sessions s
     JOIN users u ON u.id = s.user_id
     JOIN memberships m ON m.team_id = s.team_id AND m.user_id = s.user_id
     JOIN teams t ON t.id = s.team_id
     WHERE s.team_id = ? AND s.id = ? AND s.revoked_at IS NULL AND s.expires_at > ?
       AND u.disabled_at IS NULL AND m.ended_at IS NULL`,
    { type: QueryTypes.SELECT, replacements: [toBinary(ref.teamId), toBinary(ref.sessionId), new Date(nowMs)] },
  );
  const row = rows[0];
  if (!row) return null;
  if (nowMs - row.lastSeenAt.getTime() > SEEN_EVERY_MS) await extendSession(ref, nowMs);
  return contextOfRow(row, { ...ref, userId: fromBinary(row.userId) });
}

async function extendSession({ teamId, sessionId }: SessionRef, nowMs: number): Promise<void> {
  await database().models.Session.update(
    { last_seen_at: new Date(nowMs), expires_at: new Date(nowMs + SESSION_SECONDS * 1000) },
    { where: { team_id: toBinary(teamId), id: toBinary(sessionId), revoked_at: null } },
  );
}
