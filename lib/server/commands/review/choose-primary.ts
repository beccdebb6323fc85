import 'server-only';
import { z } from 'zod';
import { isUuidText } from '@/lib/kit/uuid';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { DECISION_REASON } from '@/lib/server/commands/readings/decision-reason';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { blindVisits } from '@/lib/server/queries/blind-visits';
import { isLocked } from '@/lib/server/queries/census';
import { idKey } from '@/lib/server/queries/id-key';
import { type ReviewWork, reviewWork } from './review-work';

/** Body of `POST /api/visits/<id>/primary`. */
export const PRIMARY_INPUT = z.strictObject({ reading: z.string().refine(isUuidText), reason: DECISION_REASON });

/** Which reading counts, and why. */
export interface PrimaryInput {
  id: string;
  reading: string;
  reason: string;
}

/** The answer after a choice. */
export interface PrimaryAnswer {
  visit: string;
  primary: string;
}

async function checkChoosable({ scope, item }: ReviewWork): Promise<void> {
  if ((await blindVisits(scope)).has(idKey(item.visit.id))) throw new HttpProblem('blind');
  if (item.final && isLocked(item.final)) throw new HttpProblem('locked');
}

/**
 * Says which of several field readings of a visit counts. All of them are kept; the choice is kept with its reason, and
 * a later one replaces it.
 *
 * @param input `id` of the visit, the reading that counts, and why.
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `not-found` for an unknown visit or a reading that is no field reading of it, `blind`, or
 * `locked` while the final reading is.
 */
export async function choosePrimary(ctx: TeamContext, input: PrimaryInput, nowMs: number): Promise<PrimaryAnswer> {
  const { id, reading, reason } = input;
  await reviewWork(ctx, { id, nowMs }, async (work) => {
    await checkChoosable(work);
    const { scope, item } = work;
    const chosen = item.fields.find((field) => fromBinary(field.id) === reading);
    if (!chosen) throw new HttpProblem('not-found');
    await scope.db.models.PrimaryChoice.create(
      {
        team_id: scope.team,
        visit_id: item.visit.id,
        position: (item.choice?.position ?? 0) + 1,
        reading_id: chosen.id,
        reason,
        actor_id: scope.user,
        chosen_at: new Date(nowMs),
      },
      { transaction: scope.transaction },
    );
    return { action: 'review.primary', detail: { reading, reason } };
  });
  return { visit: id, primary: reading };
}
