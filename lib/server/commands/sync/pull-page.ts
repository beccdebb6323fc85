import 'server-only';
import { Op } from 'sequelize';
import { MAX_PULL_ROWS, PROTOCOL } from '@/lib/protocol/limits';
import { parseFlags } from '@/lib/protocol/op-flags';
import { type PullResponse, type PullRow, formatCursor, parseCursor } from '@/lib/protocol/pull';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { storedOp } from '@/lib/server/db/stored-op';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { clampedInteger } from '@/lib/server/http/query-params';
import { type HeldReadings, heldReadings, isHeld } from '@/lib/server/queries/held-readings';
import { teamScope } from '@/lib/server/queries/team-scope';
import { logEnds } from './log-ends';
import { epochMismatch, storedEpoch } from './server-epoch';

/** The query of a pull as it came. */
export interface PullQuery {
  cursor?: string;
  limit?: string;
}

/** The place after which to read: from the start without a cursor. */
function startOf(cursor: string | undefined, epoch: number): number {
  if (cursor === undefined) return 0;
  const parsed = parseCursor(cursor);
  if (!parsed) throw new HttpProblem('cursor');
  if (parsed.epoch !== epoch) throw epochMismatch(epoch);
  return parsed.seq;
}

/** A place in the log, and what the person who asks gets to see there. */
interface LogPlace {
  seq: number;
  /** Null where it is kept from a second reader for now. */
  row: PullRow | null;
}

async function placesAfter(
  ctx: TeamContext,
  { start, limit }: { start: number; limit: number },
  held: HeldReadings,
): Promise<LogPlace[]> {
  const rows = await database().models.Op.findAll({
    attributes: ['seq', 'op', 'actor_id', 'flags', 'received_at', 'kind', 'reading_id'],
    where: { team_id: toBinary(ctx.teamId), seq: { [Op.gt]: start } },
    order: [['seq', 'ASC']],
    limit,
  });
  return rows.map((row) => ({
    seq: Number(row.seq),
    row: isHeld(held, row.kind, row.reading_id)
      ? null
      : {
          ...storedOp(row.op),
          seq: Number(row.seq),
          actor: fromBinary(row.actor_id),
          receivedAt: row.received_at.toISOString(),
          flags: parseFlags(row.flags),
        },
  }));
}

/**
 * One page of the team's log, in the order of commit. The order has no gaps and follows the commits, so a phone that
 * remembers `next` misses nothing. What another person read at a visit where the asker still has to read a second time
 * is left out, and `held` names the place to go back to once that visit is no longer in it.
 *
 * @throws HttpProblem `cursor`, `limit`, or `epoch-mismatch` for a cursor from before a restore.
 */
export async function pullPage(ctx: TeamContext, { cursor, limit }: PullQuery, nowMs: number): Promise<PullResponse> {
  const size = clampedInteger(limit, { min: 1, max: MAX_PULL_ROWS, otherwise: MAX_PULL_ROWS });
  const epoch = await storedEpoch();
  const start = startOf(cursor, epoch);
  const { seq, safeSeq } = await logEnds(ctx);
  const held = await heldReadings(teamScope(ctx));
  const found = await placesAfter(ctx, { start, limit: size + 1 }, held);
  const places = found.slice(0, size);
  // A cursor from beyond the end is brought back to it: reading something twice is harmless, skipping it is not.
  const next = formatCursor(epoch, places.at(-1)?.seq ?? Math.min(start, seq));
  return {
    protocol: PROTOCOL,
    epoch,
    serverTime: new Date(nowMs).toISOString(),
    safeSeq,
    rows: places.flatMap(({ row }) => row ?? []),
    next,
    more: found.length > size,
    held: held.visits.map(({ visit, seq: from }) => ({ visit, cursor: formatCursor(epoch, from) })),
  };
}
