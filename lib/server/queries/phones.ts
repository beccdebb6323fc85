import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { may } from '@/lib/server/policies/may';
import { selectRows } from './select-rows';
import { teamScope } from './team-scope';

/** An enrolled phone. Instants are ISO 8601 UTC. */
export interface PhoneAnswer {
  id: string;
  label: string;
  person: string;
  /** Is it a phone of the person who asks? */
  own: boolean;
  enrolledAt: string;
  lastSeenAt: string;
  /** What it said it still holds when it was last seen; null when it never said. */
  unsent: number | null;
  revoked: { at: string; by: string; reason: string } | null;
}

interface Row {
  id: Buffer;
  userId: Buffer;
  label: string;
  person: string;
  enrolledAt: Date;
  lastSeenAt: Date;
  unsent: number | null;
  revokedAt: Date | null;
  revokedBy: string | null;
  reason: string | null;
}

const PHONES = `
  SELECT d.id, d.user_id AS userId, d.label, u.display_name AS person, d.enrolled_at AS enrolledAt,
         d.last_seen_at AS lastSeenAt, d.unsent, d.revoked_at AS revokedAt, d.revoke_reason AS reason,
         (SELECT display_name FROM users r WHERE r.id = d.revoked_by) AS revokedBy
  FROM devices d JOIN users u ON u.id = d.user_id
  WHERE d.team_id = :team AND (:all = 1 OR d.user_id = :user)
  ORDER BY d.revoked_at IS NOT NULL, d.last_seen_at DESC, d.id`;

/** The team's phones for a coordinator, one's own for everybody else; those in use first, the latest seen on top. */
export async function phones(ctx: TeamContext): Promise<PhoneAnswer[]> {
  const scope = teamScope(ctx);
  const all = may(ctx.role, 'members.write') ? 1 : 0;
  const rows = await selectRows<Row>(scope, PHONES, { all, user: scope.user });
  return rows.map(({ id, userId, label, person, unsent, ...row }) => ({
    id: fromBinary(id),
    label,
    person,
    own: userId.equals(scope.user),
    enrolledAt: row.enrolledAt.toISOString(),
    lastSeenAt: row.lastSeenAt.toISOString(),
    unsent,
    revoked: row.revokedAt && {
      at: row.revokedAt.toISOString(),
      by: row.revokedBy ?? '',
      reason: row.reason ?? '',
    },
  }));
}
