import 'server-only';
import type { OpKind } from '@/lib/protocol/op';
import type { OpBody } from '@/lib/protocol/op-bodies';
import { OP_BODIES } from '@/lib/protocol/op-bodies';
import type { ValidOp } from '@/lib/protocol/validate-op';
import { parseWall } from '@/lib/protocol/wall-time';
import { storedDate } from '@/lib/server/db/stored-date';
import type { Actor, World } from './world';
import type { Writes } from './writes';

/** One operation being applied: it changes the world in memory and adds rows to be written. */
export interface Application {
  /** The team's id as stored. */
  team: Buffer;
  world: World;
  writes: Writes;
  op: ValidOp;
  by: Actor;
  seq: number;
}

/** The body of a checked operation with the type of its kind. */
export function bodyOf<K extends OpKind>(kind: K, op: ValidOp): OpBody<K> {
  return OP_BODIES[kind].parse(op.body) as OpBody<K>;
}

/** The instant of a checked wall time, as stored. */
export function instantOf(wall: string): Date {
  const parsed = parseWall(wall);
  if (!parsed.ok) throw new RangeError('Not a checked wall time');
  return storedDate(parsed.value.epochMs);
}

/**
 * An id that `checkReferences` has made sure of.
 *
 * @throws when it has not.
 */
export function idOf(id: string | null | undefined): string {
  if (id === null || id === undefined) throw new TypeError('An operation that names too little was applied');
  return id;
}
