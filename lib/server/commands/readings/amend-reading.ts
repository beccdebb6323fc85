import 'server-only';
import { z } from 'zod';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { HttpProblem } from '@/lib/server/http/problem';
import { DECISION_REASON } from './decision-reason';
import { type FinalVersion, finalVersion, isClosed, updateFinal, versionOf } from './final-reading';
import { labWork } from './lab-work';

/** Body of `POST /api/readings/<id>/amend`. */
export const AMEND_INPUT = z.strictObject({ reason: DECISION_REASON });

/** What is amended, and why. */
export interface AmendInput {
  id: string;
  reason: string;
}

/**
 * Opens the next version of a locked final reading. The locked one keeps its number and its cells until the new one
 * is locked in turn.
 *
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `not-found`, `blind`, or `not-locked` when there is nothing locked to amend.
 */
export async function amendReading(ctx: TeamContext, { id, reason }: AmendInput, nowMs: number): Promise<FinalVersion> {
  const decision = await labWork(ctx, { id, nowMs }, async (work) => {
    const { final } = work;
    if (!final || !isClosed(work)) throw new HttpProblem('not-locked');
    const version = versionOf(final) + 1;
    await updateFinal(work, final, { version });
    return { action: 'reading.amend', final, version, detail: { reason } };
  });
  return finalVersion(decision);
}
