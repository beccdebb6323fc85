import 'server-only';
import type { InferAttributes } from 'sequelize';
import { fromBinary, fromBinaryOrNull } from '@/lib/server/db/uuid-binary';
import type { SettlementRow } from '@/lib/server/queries/reading-cells';
import type { ReadingRow } from '@/lib/server/queries/reading-rows';
import type { Mark } from '@/models/mark';
import type { ReadingLock } from '@/models/reading-lock';
import type { Retraction } from '@/models/retraction';

/**
 * The rows the audit chain vouches for, as plain text and numbers. Every column is listed: what is not here could be
 * changed unseen, and a column added later must not change the seals of before.
 */
export type SealedFinal = ReturnType<typeof sealedFinal>;

/** A final reading as sealed. */
export function sealedFinal(row: ReadingRow) {
  return {
    id: fromBinary(row.id),
    nest: fromBinary(row.nest_id),
    visit: fromBinary(row.visit_id),
    kind: row.kind,
    source: row.source,
    aid: row.aid,
    light: row.light,
    openedBy: fromBinary(row.opened_by),
    openedAt: row.opened_at.toISOString(),
    openedAtText: row.opened_at_text,
    submittedAt: row.submitted_at?.toISOString() ?? null,
    basedOn: fromBinaryOrNull(row.based_on),
    baseSeq: row.base_seq === null ? null : Number(row.base_seq),
    version: row.version,
    lockedVersion: row.locked_version,
  };
}

/** A decision about one cell as sealed. */
export type SealedSettlement = ReturnType<typeof sealedSettlement>;

/** A decision about one cell as sealed. */
export function sealedSettlement(row: SettlementRow) {
  return {
    id: fromBinary(row.id),
    reading: fromBinary(row.reading_id),
    version: row.version,
    position: row.position,
    q: row.q,
    r: row.r,
    state: row.state,
    reason: row.reason,
    markOpId: fromBinaryOrNull(row.mark_op_id),
    pick: row.pick,
    actor: fromBinary(row.actor_id),
    createdAt: row.created_at.toISOString(),
  };
}

/** A locked version as sealed. */
export type SealedLock = ReturnType<typeof sealedLock>;

/** A locked version as sealed. */
export function sealedLock(row: InferAttributes<ReadingLock>) {
  return {
    reading: fromBinary(row.reading_id),
    version: row.version,
    cellsHash: row.cells_hash.toString('hex'),
    settingsVersion: row.settings_version,
    names: row.names,
    actor: fromBinary(row.actor_id),
    lockedAt: row.locked_at.toISOString(),
  };
}

/** A mark behind a final reading as sealed. */
export type SealedMark = ReturnType<typeof sealedMark>;

/** A mark behind a final reading as sealed. */
export function sealedMark(row: InferAttributes<Mark>) {
  return {
    opId: fromBinary(row.op_id),
    reading: fromBinary(row.reading_id),
    seq: Number(row.seq),
    q: row.q,
    r: row.r,
    state: row.state,
    nectar: Boolean(row.nectar),
    unsure: Boolean(row.unsure),
    reused: Boolean(row.reused),
    scrap: Boolean(row.scrap),
    instar: row.instar,
    note: row.note,
    supersedes: fromBinaryOrNull(row.supersedes),
    hlc: row.hlc,
    at: row.at_text,
  };
}

/** A mark taken back, behind a final reading, as sealed. */
export type SealedRetraction = ReturnType<typeof sealedRetraction>;

/** A mark taken back, behind a final reading, as sealed. */
export function sealedRetraction(row: InferAttributes<Retraction>) {
  return {
    opId: fromBinary(row.op_id),
    reading: fromBinary(row.reading_id),
    target: fromBinary(row.target),
    seq: Number(row.seq),
  };
}
