import 'server-only';
import type { Transaction } from 'sequelize';
import { isUuidText } from '@/lib/kit/uuid';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { inTransaction } from '@/lib/server/db/in-transaction';
import { HttpProblem } from '@/lib/server/http/problem';
import { lockCounter, saveCounter } from './push/lock-counter';
import { type AuditEvent, writeAudit } from './push/write-audit';

/** What an act came to, and the entry it leaves in the team's audit chain. */
export interface Done<T> {
  result: T;
  event: Omit<AuditEvent, 'at'>;
}

/**
 * Runs an act of a team in one transaction: the team's other writers wait, and the act and its audit entry stand
 * together or not at all. The act may run more than once and leaves nothing behind but rows.
 *
 * @param nowMs epoch milliseconds.
 */
export async function teamAct<T>(
  ctx: TeamContext,
  nowMs: number,
  act: (transaction: Transaction) => Promise<Done<T>>,
): Promise<T> {
  return inTransaction(async (transaction) => {
    const counter = await lockCounter(ctx, transaction);
    const { result, event } = await act(transaction);
    await writeAudit({ ctx, counter, transaction }, { ...event, at: new Date(nowMs) });
    await saveCounter(ctx, counter, transaction);
    return result;
  });
}

/**
 * An id as it stands in an address.
 *
 * @throws HttpProblem `not-found` for text that is no id, like for an id nobody has.
 */
export function idInPath(text: string | undefined): string {
  if (!isUuidText(text)) throw new HttpProblem('not-found');
  return text;
}
