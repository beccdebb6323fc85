import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';

/** How far a team's log goes. */
export interface LogEnds {
  seq: number;
  /** The highest place that is in the oldest backup a restore may use; 0 until there is one. */
  safeSeq: number;
}

/** How far the team's log goes, and how much of it is in a backup. */
export async function logEnds(ctx: TeamContext): Promise<LogEnds> {
  const row = await database().models.TeamCounter.findOne({ where: { team_id: toBinary(ctx.teamId) } });
  if (!row) throw new Error(`Team ${ctx.teamId} has no counter row.`);
  return { seq: Number(row.seq), safeSeq: Number(row.safe_seq) };
}
