import { HLC_MAX_AHEAD_MS, compareHlc, parseHlc } from '@/lib/kit/hlc';
import type { Op } from '@/lib/protocol/op';
import { queuedOp } from './local-op';
import type { Person } from './session-view';
import type { Change, Snapshot, Store, StoreMeta } from './store';
import type { UnsentFile } from './unsent-file';

/** How many operations of a file were new here, and how many this phone held already. */
export interface BroughtIn {
  added: number;
  known: number;
}

/** Most operations put into the storage at once. */
const PER_TRANSACTION = 200;

/** Is this the work of the person at this phone? Nobody else may send it: the office would write it down as theirs. */
export function isOwnFile(file: Pick<UnsentFile, 'teamId' | 'userId'>, person: Person): boolean {
  return file.teamId === person.teamId && file.userId === person.userId;
}

/** What comes next on this phone is numbered and timed after what was brought in, unless that clock ran far ahead. */
function after(meta: StoreMeta, { n, hlc }: Op, now: number): StoreMeta {
  const ms = parseHlc(hlc)?.ms ?? 0;
  const adopted = ms <= now + HLC_MAX_AHEAD_MS && compareHlc(hlc, meta.hlc) > 0;
  return { ...meta, n: Math.max(meta.n, n), hlc: adopted ? hlc : meta.hlc };
}

/** Queues what is not here yet; what is here stays as it stands. */
function takeIn(ops: readonly Op[], now: number) {
  return (before: Snapshot): Change<number> => {
    if (!before.meta) throw new Error('the storage was emptied');
    const { userId } = before.meta;
    const fresh = ops.filter((op) => !before.ops.has(op.opId));
    return {
      result: fresh.length,
      meta: fresh.reduce((meta, op) => after(meta, op, now), before.meta),
      ops: fresh.map((op) => queuedOp(op, userId, now)),
    };
  };
}

/**
 * Puts the operations of a file into the queue, with their ids, times and hashes as they are. Doing it twice changes
 * nothing, and so does sending from both phones: the office tells a repeated operation by its id.
 *
 * @param now epoch milliseconds of this phone's clock.
 */
export async function bringIn(store: Store, file: Pick<UnsentFile, 'ops'>, now: number): Promise<BroughtIn> {
  const ops = file.ops.map(({ op }) => op).sort((a, b) => a.n - b.n);
  let added = 0;
  for (let from = 0; from < ops.length; from += PER_TRANSACTION) {
    const part = ops.slice(from, from + PER_TRANSACTION);
    added += await store.transact(
      part.map(({ opId }) => opId),
      takeIn(part, now),
    );
  }
  return { added, known: ops.length - added };
}
