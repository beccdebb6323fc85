import 'server-only';
import { z } from 'zod';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { HttpProblem } from '@/lib/server/http/problem';
import { type FinalVersion, ensureFinal, finalVersion, isClosed, versionOf } from './final-reading';
import { judge } from './judged-pair';
import { labWork } from './lab-work';

/** Body of `POST /api/readings/<id>/accept`: nothing. */
export const ACCEPT_INPUT = z.strictObject({});

/**
 * Accepts, all at once, the cells that both readers saw alike, and makes the final reading of them. Cells on which they
 * differ are not touched: each is settled by itself.
 *
 * @param id of the field reading or of its final one.
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `not-found`, `blind`, `locked`, `not-primary`, `lead-settles`, or `not-waiting` without a second
 * reading to agree with.
 */
export async function acceptAlike(ctx: TeamContext, id: string, nowMs: number): Promise<FinalVersion> {
  const decision = await labWork(ctx, { id, nowMs }, async (work) => {
    if (isClosed(work)) throw new HttpProblem('locked');
    const { comparison } = await judge(ctx, work);
    if (!comparison) throw new HttpProblem('not-waiting');
    const final = await ensureFinal(work, nowMs);
    const { alike, compared } = comparison.agreement;
    return { action: 'reading.accept', final, version: versionOf(final), detail: { alike, compared } };
  });
  return finalVersion(decision);
}
