import 'server-only';
import type { Transaction } from 'sequelize';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';

/** Where a team's log and audit chain stand. A writer moves these on in memory and saves them before it commits. */
export interface Counter {
  seq: number;
  safeSeq: number;
  auditSeq: number;
  auditHash: Buffer;
}

/**
 * Locks the team's counter. This must be the first statement of every transaction that writes for a team: it puts
 * the team's writers in line, and a plain read before it would fix an older view of the data.
 */
export async function lockCounter(ctx: TeamContext, transaction: Transaction): Promise<Counter> {
  const row = await database().models.TeamCounter.findOne({
    where: { team_id: toBinary(ctx.teamId) },
    lock: transaction.LOCK.UPDATE,
    transaction,
  });
  if (!row) throw new Error(`Team ${ctx.teamId} has no counter row.`);
  return {
    seq: Number(row.seq),
    safeSeq: Number(row.safe_seq),
    auditSeq: Number(row.audit_seq),
    auditHash: row.audit_hash,
  };
}

/** Writes the counter back, as the last statement of the transaction that locked it. */
export async function saveCounter(ctx: TeamContext, counter: Counter, transaction: Transaction): Promise<void> {
  await database().models.TeamCounter.update(
    { seq: counter.seq, audit_seq: counter.auditSeq, audit_hash: counter.auditHash },
    { where: { team_id: toBinary(ctx.teamId) }, transaction },
  );
}
