import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { inTransaction } from '@/lib/server/db/in-transaction';
import { type TeamScope, teamScope } from '@/lib/server/queries/team-scope';
import { lockCounter, saveCounter } from './push/lock-counter';
import { type AuditEvent, writeAudit } from './push/write-audit';

/** What a write did, and what the audit chain says about it. */
export interface AuditedResult<Result> {
  result: Result;
  events: readonly Omit<AuditEvent, 'at'>[];
}

/**
 * Runs a write of a team in one transaction, in line with its other writers, and adds what it did to the audit chain.
 *
 * @param nowMs epoch milliseconds.
 * @param work must be repeatable; whatever it throws undoes everything.
 */
export async function auditedWrite<Result>(
  ctx: TeamContext,
  nowMs: number,
  work: (scope: TeamScope) => Promise<AuditedResult<Result>>,
): Promise<Result> {
  return inTransaction(async (transaction) => {
    const counter = await lockCounter(ctx, transaction);
    const { result, events } = await work({ ...teamScope(ctx), transaction });
    for (const event of events) await writeAudit({ ctx, counter, transaction }, { ...event, at: new Date(nowMs) });
    await saveCounter(ctx, counter, transaction);
    return result;
  });
}
