import { type Result, err, ok } from '@/lib/kit/result';
import type { Json } from './canonical-json';
import { checkBody } from './check-body';
import { checkDeps } from './check-deps';
import { type Envelope, checkEnvelope, hasIds, isNewerEnvelope } from './check-envelope';
import { checkNumbers } from './check-numbers';
import { checkSize } from './check-size';
import { checkText } from './check-text';
import { checkTime } from './check-time';
import { OP_KINDS, type Op, type OpKind } from './op';
import type { OpCode } from './op-codes';
import { hashedText } from './op-hash';

/** Why an operation cannot be looked at further: kept aside for good, or until the server learns more. */
export interface OpFault {
  r: 'quarantined' | 'parked';
  code: OpCode;
}

/** An operation whose form is right in itself; whether it fits what is stored is another question. */
export interface ValidOp extends Op {
  kind: OpKind;
}

const NEWER: OpFault = { r: 'parked', code: 'newer' };

function aside(code: OpCode): { ok: false; error: OpFault } {
  return err({ r: 'quarantined', code });
}

function isKnownKind(kind: string): kind is OpKind {
  return (OP_KINDS as readonly string[]).includes(kind);
}

function isVersion(value: Json): value is number {
  return typeof value === 'number' && Number.isSafeInteger(value) && value > 0;
}

/** Does this version know the kind in that version? Every kind is at version 1. */
export function isSupported(kind: string, kindV: number): boolean {
  return isKnownKind(kind) && kindV === 1;
}

/** What holds for every kind, also for those only a newer server knows. */
function checkForm(envelope: Envelope & { opId: string }): OpCode | null {
  const { opId, deps, n } = envelope;
  if (!Number.isInteger(n) || n < 0) return 'number';
  return checkDeps(opId, deps);
}

/** What only makes sense once the kind is known. */
function checkContent(op: ValidOp, sha256: (text: string) => string): OpCode | null {
  const code = checkTime(op.at.wall) ?? checkBody(op.kind, op) ?? checkSize(op);
  if (code) return code;
  return sha256(hashedText(op)) === op.bodyHash ? null : 'hash';
}

/**
 * Judges one pushed operation by itself, in a fixed order, so that one fault always has one code.
 *
 * @param value what came, whatever it is.
 * @param sha256 lower-case hex SHA-256 of UTF-8 text.
 */
export function validateOp(value: Json, sha256: (text: string) => string): Result<ValidOp, OpFault> {
  if (isNewerEnvelope(value)) return err(NEWER);
  const checked = checkEnvelope(value);
  if (!checked.ok) return aside(checked.error);
  const envelope = checked.value;
  if (!hasIds(envelope)) return aside('id');
  const code = checkText(value) ?? checkNumbers(value) ?? checkForm(envelope);
  if (code) return aside(code);
  const { kind, kindV, bodyHash } = envelope;
  if (!isVersion(kindV)) return aside('kind');
  if (!isKnownKind(kind) || !isSupported(kind, kindV)) return err(NEWER);
  const op: ValidOp = { ...envelope, kind, kindV, deps: envelope.deps.map(String), bodyHash: String(bodyHash) };
  const fault = checkContent(op, sha256);
  return fault ? aside(fault) : ok(op);
}
