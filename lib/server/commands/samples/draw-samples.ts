import 'server-only';
import { createHash } from 'node:crypto';
import { z } from 'zod';
import { localDate } from '@/lib/kit/local-date';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { lockCounter, saveCounter } from '@/lib/server/commands/push/lock-counter';
import { writeAudit } from '@/lib/server/commands/push/write-audit';
import { inTransaction } from '@/lib/server/db/in-transaction';
import { newId } from '@/lib/server/db/new-id';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { lockedInMonth } from '@/lib/server/queries/locked-in-month';
import { type TeamScope, teamScope } from '@/lib/server/queries/team-scope';
import { seededSample } from '@/lib/stats/seeded-sample';

/** Body of `POST /api/samples`: a month that is over. */
export const SAMPLES_INPUT = z.strictObject({ month: z.string().regex(/^[1-9]\d{3}-(0[1-9]|1[0-2])$/) });

/** How many of a month's locked readings are to be read again, by whom. */
const SHARES = { 'other-reader': 0.1, 'same-reader': 0.05 } as const;

/** Who reads again. */
type Purpose = keyof typeof SHARES;

/** What stands drawn for a month. */
export interface DrawnSamples {
  month: string;
  otherReader: number;
  sameReader: number;
}

/** The seed of a draw: nobody chooses it, and anybody can work it out again. */
function seedOf(ctx: TeamContext, month: string, purpose: Purpose): number {
  return createHash('sha256').update(`${ctx.teamId} ${month} ${purpose}`).digest().readUInt32BE(0);
}

function countOf(rows: readonly { purpose: string }[], month: string): DrawnSamples {
  const count = (purpose: Purpose) => rows.filter((row) => row.purpose === purpose).length;
  return { month, otherReader: count('other-reader'), sameReader: count('same-reader') };
}

async function drawRows(ctx: TeamContext, scope: TeamScope, { month, at }: { month: string; at: Date }) {
  const locked = await lockedInMonth(scope, ctx.zone, month);
  return (Object.keys(SHARES) as Purpose[]).flatMap((purpose) => {
    const seed = seedOf(ctx, month, purpose);
    return seededSample(locked, { share: SHARES[purpose], seed }).map((reading) => ({
      team_id: scope.team,
      id: toBinary(newId()),
      month,
      purpose,
      reading_id: reading,
      seed,
      drawn_by: scope.user,
      drawn_at: at,
    }));
  });
}

/**
 * Draws the readings of a month that are to be read again: 10 % by another reader, 5 % by the same one, both rounded
 * up. A month is drawn once; asking again answers with what was drawn.
 *
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `param` for a month that is not over yet.
 */
export async function drawSamples(ctx: TeamContext, month: string, nowMs: number): Promise<DrawnSamples> {
  if (month >= localDate(nowMs, ctx.zone).slice(0, 7)) throw new HttpProblem('param');
  return inTransaction(async (transaction) => {
    const counter = await lockCounter(ctx, transaction);
    const scope = { ...teamScope(ctx), transaction };
    const { ReadingSample } = scope.db.models;
    const drawn = await ReadingSample.findAll({ where: { team_id: scope.team, month }, raw: true, transaction });
    if (drawn.length > 0) return countOf(drawn, month);
    const at = new Date(nowMs);
    const rows = await drawRows(ctx, scope, { month, at });
    await ReadingSample.bulkCreate(rows, { transaction });
    const samples = rows.map(({ purpose, reading_id, seed }) => ({ purpose, reading: fromBinary(reading_id), seed }));
    await writeAudit(
      { ctx, counter, transaction },
      { action: 'samples.draw', subjectId: null, detail: { month, samples }, at },
    );
    await saveCounter(ctx, counter, transaction);
    return countOf(rows, month);
  });
}
