import 'server-only';
import { createHash } from 'node:crypto';
import { type Hlc, formatHlc, tickHlc } from '@/lib/kit/hlc';
import type { Op, OpTime } from '@/lib/protocol/op';
import { hashedText } from '@/lib/protocol/op-hash';
import { demoId, demoSeed } from './demo-id';
import { isoWithOffset } from './demo-time';
import type { Draft } from './draft';

/** The device that seals operations. */
export interface SealingDevice {
  id: string;
  /** The offset its wall clock shows. */
  offset: string;
}

/** An operation with the time it reached the office. */
export interface SealedOp {
  op: Op;
  sentMs: number;
}

/** The clocks of the device at an instant: it is switched on at local midnight and never quite right. */
function timeOf(atMs: number, { id, offset }: SealingDevice): OpTime {
  const wall = isoWithOffset(atMs, offset);
  const date = wall.slice(0, 10);
  const bootMs = Date.parse(`${date}T00:00:00.000${offset}`);
  return { wall, mono: atMs - bootMs, boot: demoId(`boot/${id}/${date}`), skewMs: (demoSeed(id) % 1_800) - 900 };
}

function sealed(draft: Draft, { n, hlc, device }: { n: number; hlc: Hlc; device: SealingDevice }): Op {
  const { opId, kind, nest, visit, reading, deps, body, atMs } = draft;
  const bare = { v: 1 as const, opId, kind, kindV: 1, deviceId: device.id, n, nest, visit, reading };
  const part = { ...bare, at: timeOf(atMs, device), hlc: formatHlc(hlc), deps, body };
  return { ...part, bodyHash: createHash('sha256').update(hashedText(part), 'utf8').digest('hex') };
}

/**
 * Numbers, times and hashes what one device recorded, in the order it was recorded.
 *
 * @param drafts all operations of the device, any order.
 */
export function sealOps(drafts: readonly Draft[], device: SealingDevice): SealedOp[] {
  let hlc: Hlc = { ms: 0, counter: 0 };
  return [...drafts]
    .sort((a, b) => a.atMs - b.atMs)
    .map((draft, i) => {
      hlc = tickHlc(hlc, draft.atMs);
      return { op: sealed(draft, { n: i + 1, hlc, device }), sentMs: draft.sentMs };
    });
}
