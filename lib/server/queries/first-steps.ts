import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { selectRows } from './select-rows';
import { teamScope } from './team-scope';

/** How far a team has come with its first nest. */
export interface FirstStepsAnswer {
  technicians: number;
  /** Unanswered invitations to technicians. */
  invited: number;
  /** Phones that may send. */
  phones: number;
  nests: number;
  /** Readings that were handed in. */
  readings: number;
  /** The latest nest with a reading that was handed in, whose dates can be seen. */
  dated: { id: string; code: string } | null;
}

interface CountRow {
  technicians: number;
  invited: number;
  phones: number;
  nests: number;
  readings: number;
}

const COUNTS = `
  SELECT (SELECT COUNT(*) FROM memberships m WHERE m.team_id = :team AND m.role = 'technician'
            AND m.ended_at IS NULL) AS technicians,
         (SELECT COUNT(*) FROM invitations i WHERE i.team_id = :team AND i.role = 'technician'
            AND i.accepted_at IS NULL AND i.withdrawn_at IS NULL) AS invited,
         (SELECT COUNT(*) FROM devices d WHERE d.team_id = :team AND d.revoked_at IS NULL) AS phones,
         (SELECT COUNT(*) FROM nests n WHERE n.team_id = :team) AS nests,
         (SELECT COUNT(*) FROM readings r WHERE r.team_id = :team AND r.submitted_at IS NOT NULL) AS readings`;

const DATED = `
  SELECT n.id, n.code FROM readings r JOIN nests n ON n.team_id = r.team_id AND n.id = r.nest_id
  WHERE r.team_id = :team AND r.submitted_at IS NOT NULL ORDER BY r.submitted_at DESC, n.id LIMIT 1`;

/** What of the way to a first dated nest the team has behind it. */
export async function firstSteps(ctx: TeamContext): Promise<FirstStepsAnswer> {
  const scope = teamScope(ctx);
  const [counts] = await selectRows<CountRow>(scope, COUNTS);
  const [dated] = await selectRows<{ id: Buffer; code: string }>(scope, DATED);
  return {
    technicians: Number(counts?.technicians ?? 0),
    invited: Number(counts?.invited ?? 0),
    phones: Number(counts?.phones ?? 0),
    nests: Number(counts?.nests ?? 0),
    readings: Number(counts?.readings ?? 0),
    dated: dated ? { id: fromBinary(dated.id), code: dated.code } : null,
  };
}
