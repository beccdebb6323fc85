import 'server-only';
import type { InferAttributes } from 'sequelize';
import type { AuditLink } from '@/lib/server/commands/push/write-audit';
import { fromBinary, fromBinaryOrNull } from '@/lib/server/db/uuid-binary';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import type { AuditEntry } from '@/models/audit-entry';
import { sealedReadings } from './load-sealed';
import { marksDigest } from './seal';
import { type SealedFinal, type SealedLock, type SealedSettlement, sealedLock, sealedSettlement } from './sealed-rows';

/** One entry of the chain as stored; hashes are hex, the time ISO 8601. */
export interface StoredLink extends Omit<AuditLink, 'at'> {
  at: string;
  previousHash: string;
  hash: string;
}

/** Everything the check looks at, as plain values. */
export interface AuditSnapshot {
  /** In the order of their numbers. */
  entries: StoredLink[];
  /** Where the counter says that the chain ends. */
  head: { seq: number; hash: string };
  finals: SealedFinal[];
  settlements: SealedSettlement[];
  locks: SealedLock[];
  /** By id of the final reading: the hash of the marks it stands on. */
  marks: Record<string, string>;
}

function storedLink(row: InferAttributes<AuditEntry>): StoredLink {
  const { action, detail } = row;
  return {
    teamId: fromBinary(row.team_id),
    seq: Number(row.seq),
    at: row.at.toISOString(),
    actorId: fromBinaryOrNull(row.actor_id),
    action,
    subjectId: fromBinaryOrNull(row.subject_id),
    detail,
    previousHash: row.previous_hash.toString('hex'),
    hash: row.hash.toString('hex'),
  };
}

/** Reads a team's chain and what it vouches for. The scope carries a transaction, so that both are of one moment. */
export async function auditSnapshot(scope: TeamScope): Promise<AuditSnapshot> {
  const { team, db, transaction } = scope;
  const of = { where: { team_id: team }, transaction } as const;
  const counter = await db.models.TeamCounter.findOne({ ...of, raw: true, rejectOnEmpty: true });
  const entries = await db.models.AuditEntry.findAll({ ...of, order: [['seq', 'ASC']], raw: true });
  // All of them, not only those of final readings: a row that hangs on nothing was put there by hand.
  const settlements = await db.models.Settlement.findAll({ ...of, raw: true });
  const locks = await db.models.ReadingLock.findAll({ ...of, raw: true });
  const finals: SealedFinal[] = [];
  const marks: Record<string, string> = {};
  for await (const page of sealedReadings(scope)) {
    for (const reading of page) {
      finals.push(reading.final);
      marks[reading.final.id] = marksDigest(reading);
    }
  }
  return {
    entries: entries.map(storedLink),
    head: { seq: Number(counter.audit_seq), hash: counter.audit_hash.toString('hex') },
    finals,
    settlements: settlements.map(sealedSettlement),
    locks: locks.map(sealedLock),
    marks,
  };
}
