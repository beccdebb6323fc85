import 'server-only';
import { z } from 'zod';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { HttpProblem } from '@/lib/server/http/problem';
import { type ReviewWork, reviewWork } from './review-work';

/** Body of `POST /api/visits/<id>/claim`: nothing. */
export const CLAIM_INPUT = z.strictObject({});

/** A visit of the queue that somebody took on or gave back. */
export interface ClaimAnswer {
  visit: string;
  /** Has the person who asked taken it on? */
  claimed: boolean;
}

function checkClaimable({ scope, item, claim }: ReviewWork): void {
  const { fields, second } = item;
  if (fields.some(({ opened_by }) => opened_by.equals(scope.user))) throw new HttpProblem('own-reading');
  if (fields.length === 0 || second) throw new HttpProblem('not-waiting');
  if (claim && !claim.user_id.equals(scope.user)) throw new HttpProblem('claimed');
}

/**
 * Takes on the second reading of a visit. From here on the person sees nothing of the first reading, in no page, file
 * or log, until theirs is handed in or given back. Taking on what one has already changes nothing.
 *
 * @param id of the visit.
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `not-found`, `own-reading`, `not-waiting`, or `claimed` for all but the first of several people.
 */
export async function claimVisit(ctx: TeamContext, id: string, nowMs: number): Promise<ClaimAnswer> {
  await reviewWork(ctx, { id, nowMs }, async (work) => {
    checkClaimable(work);
    if (work.claim) return null;
    const { scope, item } = work;
    await scope.db.models.ReviewClaim.create(
      { team_id: scope.team, visit_id: item.visit.id, user_id: scope.user, claimed_at: new Date(nowMs) },
      { transaction: scope.transaction },
    );
    return { action: 'review.claim', detail: {} };
  });
  return { visit: id, claimed: true };
}
