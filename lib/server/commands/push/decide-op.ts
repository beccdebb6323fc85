import 'server-only';
import type { ValidOp } from '@/lib/protocol/validate-op';
import { checkKind } from './check-kind';
import { checkReferences } from './check-references';
import type { Decision, Objection } from './decision';
import { flagsOf } from './flags-of';
import type { Actor, World } from './world';

/** An operation, who sent it and when it arrived (epoch milliseconds). */
export interface Submission {
  op: ValidOp;
  by: Actor;
  receivedMs: number;
}

/** The same id again: the same operation once more, or another one under its name. */
function checkKnown(world: World, op: ValidOp): Objection | null {
  const known = world.ops.get(op.opId);
  if (!known) return null;
  return known.bodyHash === op.bodyHash ? { r: 'duplicate', seq: known.seq } : { r: 'conflict', code: 'conflict' };
}

/** Decides what becomes of an operation. Pure: looks at the world and changes nothing. */
export function decideOp(world: World, { op, by, receivedMs }: Submission): Decision {
  return (
    checkKnown(world, op) ??
    checkReferences(world, op) ??
    checkKind({ world, op, by }) ?? { r: 'applied', flags: flagsOf(world, op, receivedMs) }
  );
}
