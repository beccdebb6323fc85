import 'server-only';
import type { OpCode, OpFlag } from '@/lib/protocol/op-codes';

/** What becomes of an operation that is right in itself, given what the team has. */
export type Decision =
  | { r: 'applied'; flags: OpFlag[] }
  | { r: 'duplicate'; seq: number }
  /** `missing` names operations and entities that have not arrived. */
  | { r: 'parked'; code: OpCode; missing: string[] }
  | { r: 'quarantined' | 'conflict' | 'refused'; code: OpCode };

/** Any outcome but being applied. */
export type Objection = Exclude<Decision, { r: 'applied' }>;

/** It can never be applied; kept for a person to look at. */
export function quarantined(code: OpCode): Objection {
  return { r: 'quarantined', code };
}

/** The sender may not do this. */
export const NO_RIGHT: Objection = { r: 'refused', code: 'right' };
