import type { Op } from '@/lib/protocol/op';
import type { PushOutcome } from '@/lib/protocol/push';

/**
 * Where an operation stands on this phone.
 * `queued`: saved, waits to be sent. `held`: the office has it, kept here until a backup has it too.
 * `refused`: the office does not take it from this person. `suspect`: the office fails over it; retried daily.
 * `remote`: came from the office.
 */
export type OpState = 'queued' | 'held' | 'refused' | 'suspect' | 'remote';

/** An operation as this phone keeps it: the envelope, and copies of what is searched for. */
export interface LocalOp {
  /** The `opId`; for an office row that contradicts an operation of this phone, see `officeKey`. */
  key: string;
  op: Op;
  kind: string;
  nest: string | null;
  visit: string | null;
  reading: string | null;
  n: number;
  state: OpState;
  /** User id of its author. */
  actor: string;
  /** What the office made of it, once it answered. */
  outcome: PushOutcome | null;
  /** Why, when the outcome needs a reason. */
  code: string | null;
  /** The office's order, when it was applied. 0 sorts before every number. */
  seq: number;
  /** The epoch in which `state` and `seq` were learnt; 0 when never. */
  epoch: number;
  flags: string[];
  /** A person has looked at the refusal; it stays listed but asks for nobody any more. */
  seen: boolean;
  /** Epoch milliseconds of the phone's clock when it was saved or arrived. */
  savedAt: number;
  /** When the office last answered or failed over it. */
  triedAt: number | null;
}

/** An operation before the phone's counters are put on it, which happens in the transaction that saves it. */
export type OpDraft = Omit<Op, 'n' | 'hlc' | 'deviceId'>;

/** The key of an office row whose `opId` this phone uses for something else. Both are kept. */
export function officeKey(opId: string): string {
  return `${opId}~office`;
}

/** The row of a freshly saved operation. */
export function queuedOp(op: Op, actor: string, savedAt: number): LocalOp {
  const { kind, nest, visit, reading, n } = op;
  const unknown = { outcome: null, code: null, seq: 0, epoch: 0, flags: [], seen: false, triedAt: null };
  return { key: op.opId, op, kind, nest, visit, reading, n, state: 'queued', actor, savedAt, ...unknown };
}
