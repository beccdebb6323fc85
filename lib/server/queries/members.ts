import 'server-only';
import { type Role, isRole } from '@/lib/server/auth/role';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { type LetterBox, letterBox } from '@/lib/server/mail/letter-box';
import { selectRows } from './select-rows';
import { teamScope } from './team-scope';

/** A person of the team. Instants are ISO 8601 UTC. */
export interface MemberAnswer {
  id: string;
  name: string;
  email: string;
  role: Role;
  /** Sign-ins that still stand. */
  sessions: number;
  lastSeenAt: string | null;
  /** When the person left; null for a member. */
  endedAt: string | null;
}

/** An invitation nobody has answered. */
export interface InvitationAnswer {
  id: string;
  email: string;
  role: Role;
  expiresAt: string;
  expired: boolean;
  /** Did its latest letter go out? */
  sent: boolean;
}

/** Everybody of the team, and who is asked to join. */
export interface MembersAnswer {
  members: MemberAnswer[];
  former: MemberAnswer[];
  invitations: InvitationAnswer[];
  /** Where letters go on this server. */
  box: LetterBox;
}

interface MemberRow {
  id: Buffer;
  name: string;
  email: string;
  role: string;
  endedAt: Date | null;
  sessions: number;
  lastSeenAt: Date | null;
}

const MEMBERS = `
  SELECT u.id, u.display_name AS name, u.email, m.role, m.ended_at AS endedAt,
         (SELECT COUNT(*) FROM sessions s WHERE s.team_id = :team AND s.user_id = u.id
            AND s.revoked_at IS NULL AND s.expires_at > :now) AS sessions,
         (SELECT MAX(s.last_seen_at) FROM sessions s WHERE s.team_id = :team AND s.user_id = u.id) AS lastSeenAt
  FROM memberships m JOIN users u ON u.id = m.user_id
  WHERE m.team_id = :team ORDER BY u.display_name, u.id`;

interface InvitationRow {
  id: Buffer;
  email: string;
  role: string;
  expiresAt: Date;
  sentAt: Date | null;
}

const INVITATIONS = `
  SELECT i.id, i.email, i.role, i.expires_at AS expiresAt,
         (SELECT l.sent_at FROM letters l WHERE l.team_id = :team AND l.subject_id = i.id
          ORDER BY l.written_at DESC, l.id DESC LIMIT 1) AS sentAt
  FROM invitations i
  WHERE i.team_id = :team AND i.accepted_at IS NULL AND i.withdrawn_at IS NULL ORDER BY i.email`;

function memberOf({ id, name, email, role, endedAt, sessions, lastSeenAt }: MemberRow): MemberAnswer[] {
  if (!isRole(role)) return [];
  const times = { endedAt: endedAt?.toISOString() ?? null, lastSeenAt: lastSeenAt?.toISOString() ?? null };
  return [{ id: fromBinary(id), name, email, role, sessions: Number(sessions), ...times }];
}

/**
 * Everybody of the team by name, with the invitations that stand open. For the coordinator.
 *
 * @param nowMs epoch milliseconds.
 */
export async function teamMembers(ctx: TeamContext, nowMs: number): Promise<MembersAnswer> {
  const scope = teamScope(ctx);
  const now = new Date(nowMs);
  const everybody = (await selectRows<MemberRow>(scope, MEMBERS, { now })).flatMap(memberOf);
  const open = await selectRows<InvitationRow>(scope, INVITATIONS);
  return {
    members: everybody.filter(({ endedAt }) => endedAt === null),
    former: everybody.filter(({ endedAt }) => endedAt !== null),
    invitations: open.flatMap(({ id, email, role, expiresAt, sentAt }) => {
      if (!isRole(role)) return [];
      const standing = { expired: expiresAt.getTime() <= nowMs, sent: sentAt !== null };
      return [{ id: fromBinary(id), email, role, expiresAt: expiresAt.toISOString(), ...standing }];
    }),
    box: await letterBox(),
  };
}
