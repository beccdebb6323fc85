import 'server-only';
import { QueryTypes } from 'sequelize';
import { systemClock } from '@/lib/kit/system-clock';
import { database } from '@/lib/server/db/database';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { type Role, isRole } from './role';
import { tokenHash } from './secret-link';

/** An invitation whose link still works. */
export interface OpenInvitation {
  teamId: string;
  id: string;
  email: string;
  role: Role;
  teamName: string;
  /** Has the address an account already, in whatever team? */
  hasAccount: boolean;
}

interface Row {
  teamId: Buffer;
  id: Buffer;
  email: string;
  role: string;
  teamName: string;
  accounts: number;
}

/**
 * The invitation a link belongs to; null for a link that was used, withdrawn, has run out or never was one. Looking
 * changes nothing: mail programs open links too.
 */
export async function openInvitation(token: string, nowMs = systemClock.now()): Promise<OpenInvitation | null> {
  const hash = tokenHash(token);
  if (!hash) return null;
  const rows = await database().sequelize.query<Row>(
    `SELECT i.team_id AS teamId, i.id, i.email, i.role, t.name AS teamName,
            (SELECT COUNT(*) FROM users u WHERE u.email = i.email) AS accounts
     FROM invitations i JOIN teams t ON t.id = i.team_id
     WHERE i.token_hash = ? AND i.accepted_at IS NULL AND i.withdrawn_at IS NULL AND i.expires_at > ?`,
    { type: QueryTypes.SELECT, replacements: [hash, new Date(nowMs)] },
  );
  const row = rows[0];
  if (!row || !isRole(row.role)) return null;
  const { email, role, teamName } = row;
  const ids = { teamId: fromBinary(row.teamId), id: fromBinary(row.id) };
  return { ...ids, email, role, teamName, hasAccount: Number(row.accounts) > 0 };
}
