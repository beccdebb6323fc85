import 'server-only';
import type { HaveResponse } from '@/lib/protocol/enrol';
import { MAX_HAVE_IDS, PROTOCOL } from '@/lib/protocol/limits';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { storedEpoch } from './server-epoch';

/**
 * Which of these operations stand in the team's log. What is only parked or set aside is not among them: sending it
 * again does no harm and may find its place by now.
 *
 * @throws HttpProblem `batch` for more ids than one question may hold.
 */
export async function haveOps(ctx: TeamContext, opIds: readonly string[], nowMs: number): Promise<HaveResponse> {
  if (opIds.length > MAX_HAVE_IDS) throw new HttpProblem('batch');
  const asked = [...new Set(opIds)];
  const rows = await database().models.Op.findAll({
    attributes: ['op_id'],
    where: { team_id: toBinary(ctx.teamId), op_id: asked.map(toBinary) },
  });
  const held = new Set(rows.map((row) => fromBinary(row.op_id)));
  const serverTime = new Date(nowMs).toISOString();
  return { protocol: PROTOCOL, epoch: await storedEpoch(), serverTime, have: asked.filter((id) => held.has(id)) };
}
