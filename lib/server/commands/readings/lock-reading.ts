import 'server-only';
import { z } from 'zod';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { HttpProblem } from '@/lib/server/http/problem';
import { type FinalVersion, ensureFinal, finalVersion, isClosed, updateFinal, versionOf } from './final-reading';
import { labWork } from './lab-work';

/** Body of `POST /api/readings/<id>/lock`: nothing. */
export const LOCK_INPUT = z.strictObject({});

/**
 * Locks the final reading at the version it is at; from then on only an amendment may change it. A reading that needed
 * no correction gets its final reading here.
 *
 * @param input `id` of the reading or of its final one.
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `not-found`, `blind`, or `locked` when this version is locked already.
 */
export async function lockReading(ctx: TeamContext, { id }: { id: string }, nowMs: number): Promise<FinalVersion> {
  const decision = await labWork(ctx, { id, nowMs }, async (work) => {
    if (isClosed(work)) throw new HttpProblem('locked');
    const final = await ensureFinal(work, nowMs);
    const version = versionOf(final);
    await updateFinal(work, final, { opened_by: work.scope.user, locked_version: version });
    return { action: 'reading.lock', final, version, detail: {} };
  });
  return finalVersion(decision);
}
