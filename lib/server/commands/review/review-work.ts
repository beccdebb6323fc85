import 'server-only';
import { isUuidText } from '@/lib/kit/uuid';
import type { Json } from '@/lib/protocol/canonical-json';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { lockCounter, saveCounter } from '@/lib/server/commands/push/lock-counter';
import { writeAudit } from '@/lib/server/commands/push/write-audit';
import { inTransaction } from '@/lib/server/db/in-transaction';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { type ClaimRow, claimOf } from '@/lib/server/queries/review/claims';
import { type ReviewVisit, reviewVisit } from '@/lib/server/queries/review/review-visits';
import { type TeamScope, teamScope } from '@/lib/server/queries/team-scope';

/** What every command on a visit's review starts from, read after the team's other writers were locked out. */
export interface ReviewWork {
  scope: TeamScope;
  item: ReviewVisit;
  claim: ClaimRow | null;
}

/** What a command did, for the audit chain; null when there was nothing to do. */
export interface ReviewDeed {
  action: 'review.claim' | 'review.release' | 'review.primary';
  detail: { [key: string]: Json };
}

/**
 * Runs a command about the review of one visit in a transaction of its own and adds it to the team's audit chain. The
 * team's counter row is locked first, so that of two people who want the same thing one comes first.
 *
 * @param id of the visit, as it stands in the address.
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `not-found` for an unknown visit or another team's.
 */
export async function reviewWork(
  ctx: TeamContext,
  { id, nowMs }: { id: string; nowMs: number },
  act: (work: ReviewWork) => Promise<ReviewDeed | null>,
): Promise<void> {
  if (!isUuidText(id)) throw new HttpProblem('not-found');
  await inTransaction(async (transaction) => {
    const counter = await lockCounter(ctx, transaction);
    const scope = { ...teamScope(ctx), transaction };
    const item = await reviewVisit(scope, toBinary(id));
    if (!item) throw new HttpProblem('not-found');
    const deed = await act({ scope, item, claim: await claimOf(scope, item.visit.id) });
    if (!deed) return;
    await writeAudit({ ctx, counter, transaction }, { ...deed, subjectId: id, at: new Date(nowMs) });
    await saveCounter(ctx, counter, transaction);
  });
}
