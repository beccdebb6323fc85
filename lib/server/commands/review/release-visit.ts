import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import type { ClaimAnswer } from './claim-visit';
import { reviewWork } from './review-work';

/**
 * Gives a second reading back to the queue. The lead biologist may free what somebody else has taken on. Marks made so
 * far stay, and while their reading is open its reader stays blind.
 *
 * @param id of the visit.
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `not-found`, or `not-claimed` when there is nothing of one's own to give back.
 */
export async function releaseVisit(ctx: TeamContext, id: string, nowMs: number): Promise<ClaimAnswer> {
  await reviewWork(ctx, { id, nowMs }, async ({ scope, item, claim }) => {
    const mayFree = claim && (claim.user_id.equals(scope.user) || ctx.role === 'biologist');
    if (!mayFree) throw new HttpProblem('not-claimed');
    const where = { team_id: scope.team, visit_id: item.visit.id };
    await scope.db.models.ReviewClaim.destroy({ where, transaction: scope.transaction });
    return { action: 'review.release', detail: { reader: fromBinary(claim.user_id) } };
  });
  return { visit: id, claimed: false };
}
