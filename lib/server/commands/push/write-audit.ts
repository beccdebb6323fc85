import 'server-only';
import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { type Json, canonicalJson } from '@/lib/protocol/canonical-json';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { toBinary, toBinaryOrNull } from '@/lib/server/db/uuid-binary';
import type { Counter } from './lock-counter';

/** Something worth remembering: who did what to which entity. */
export interface AuditEvent {
  /** A short word such as `push` or `lock`. */
  action: string;
  subjectId: string | null;
  /** Ids, numbers, hashes and the reason a person gave for a decision; never places. */
  detail: { [key: string]: Json };
  at: Date;
}

/** An entry of the chain as it is hashed. */
export interface AuditLink extends Omit<AuditEvent, 'detail'> {
  teamId: string;
  seq: number;
  actorId: string | null;
  /** Canonical JSON of the detail. */
  detail: string;
}

/** The hash of an entry: SHA-256 over the hash before it and the entry's canonical JSON. */
export function auditHash(
  previous: Buffer,
  { teamId, seq, at, actorId, action, subjectId, detail }: AuditLink,
): Buffer {
  const text = canonicalJson({ teamId, seq, at: at.toISOString(), actorId, action, subjectId, detail });
  return createHash('sha256').update(previous).update(text).digest();
}

/** What a write happens in. */
export interface LockedWrite {
  ctx: TeamContext;
  counter: Counter;
  transaction: Transaction;
}

/** Adds an entry to the team's audit chain and moves the counter on; `saveCounter` then makes it stand. */
export async function writeAudit({ ctx, counter, transaction }: LockedWrite, event: AuditEvent): Promise<void> {
  const { action, subjectId, at } = event;
  const seq = counter.auditSeq + 1;
  const detail = canonicalJson(event.detail);
  const hash = auditHash(counter.auditHash, {
    teamId: ctx.teamId,
    seq,
    actorId: ctx.userId,
    action,
    subjectId,
    at,
    detail,
  });
  await database().models.AuditEntry.create(
    {
      team_id: toBinary(ctx.teamId),
      seq,
      at,
      actor_id: toBinary(ctx.userId),
      action,
      subject_id: toBinaryOrNull(subjectId),
      detail,
      previous_hash: counter.auditHash,
      hash,
    },
    { transaction },
  );
  counter.auditSeq = seq;
  counter.auditHash = hash;
}
