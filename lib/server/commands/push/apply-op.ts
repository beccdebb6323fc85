import 'server-only';
import type { OpFlag } from '@/lib/protocol/op-codes';
import { formatFlags } from '@/lib/protocol/op-flags';
import type { OpKind } from '@/lib/protocol/op';
import { registerOf } from '@/lib/protocol/register-of';
import type { ValidOp } from '@/lib/protocol/validate-op';
import { toBinary, toBinaryOrNull } from '@/lib/server/db/uuid-binary';
import type { Application } from './application';
import { applyArchive } from './apply-archive';
import { applyCellMark, applyCellRetract, applyReadingSubmit } from './apply-cell';
import { applyNestOpen, applyReadingOpen, applyVisitOpen } from './apply-open';
import { applyRegister } from './apply-register';

/** What an operation of each kind does beyond standing in the log. */
const EFFECTS: Partial<Record<OpKind, (application: Application) => void>> = {
  'nest.open': applyNestOpen,
  'visit.open': applyVisitOpen,
  'reading.open': applyReadingOpen,
  'cell.mark': applyCellMark,
  'cell.retract': applyCellRetract,
  'reading.submit': applyReadingSubmit,
  'field.set': applyRegister,
  'note.set': applyRegister,
  'entity.archive': applyArchive,
};

/** How an applied operation arrived. */
export interface Arrival {
  deviceId: string | null;
  flags: readonly OpFlag[];
  receivedMs: number;
}

/** The operation as it is kept: exactly the members of the envelope. */
function opText({
  v,
  opId,
  kind,
  kindV,
  deviceId,
  n,
  nest,
  visit,
  reading,
  at,
  hlc,
  deps,
  body,
  bodyHash,
}: ValidOp): string {
  return JSON.stringify({ v, opId, kind, kindV, deviceId, n, nest, visit, reading, at, hlc, deps, body, bodyHash });
}

/** Applies one operation: its place in the log, and what it does to nests, visits and readings. */
export function applyOp(application: Application, { deviceId, flags, receivedMs }: Arrival): void {
  const { team, world, writes, op, by, seq } = application;
  const { opId, kind, nest, visit, reading, hlc, bodyHash } = op;
  writes.ops.push({
    team_id: team,
    op_id: toBinary(opId),
    seq,
    kind,
    nest_id: toBinaryOrNull(nest),
    visit_id: toBinaryOrNull(visit),
    reading_id: toBinaryOrNull(reading),
    actor_id: toBinary(by.userId),
    device_id: toBinaryOrNull(deviceId),
    hlc,
    op: opText(op),
    body_hash: Buffer.from(bodyHash, 'hex'),
    flags: formatFlags(flags),
    received_at: new Date(receivedMs),
  });
  world.ops.set(opId, { seq, bodyHash, kind, nest, visit, reading, actorId: by.userId, register: registerOf(op) });
  EFFECTS[kind]?.(application);
}
