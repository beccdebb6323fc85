import type { DrainPorts } from './drain-ports';
import type { LocalOp } from './local-op';
import type { Change, Snapshot } from './store';

/** How long an operation that the office has is kept ready to be offered again. */
export const RETAIN_MS = 30 * 24 * 3_600_000;

/** Most operations released in one pass. */
const PER_PASS = 500;

/** In the log, in a backup that every restore would bring back, and old enough. */
function isSafe(row: LocalOp, { safeSeq, epoch }: { safeSeq: number; epoch: number }, now: number): boolean {
  const counted = row.state === 'held' && row.seq > 0 && row.seq <= safeSeq && row.epoch === epoch;
  return counted && now - row.savedAt >= RETAIN_MS;
}

/** Turns safe operations into ordinary office rows: still shown, no longer offered again. */
export function releaseSafe(now: number) {
  return ({ meta, ops }: Snapshot): Change<number> => {
    if (!meta || meta.resync || meta.reofferAfter !== null) return { result: 0 };
    const safe = [...ops.values()].filter((row) => row.seq <= meta.cursor && isSafe(row, meta, now));
    return { result: safe.length, ops: safe.map((row) => ({ ...row, state: 'remote' })) };
  };
}

/** Releases what needs no second copy any more. Age is counted by the office's clock where that is known. */
export async function purge({ store, clock }: Pick<DrainPorts, 'store' | 'clock'>): Promise<number> {
  const meta = await store.readMeta();
  if (!meta || meta.safeSeq === 0) return 0;
  const held = await store.heldUpTo(meta.safeSeq, PER_PASS);
  const now = clock.now() + (meta.skewMs ?? 0);
  return store.transact(
    held.map((row) => row.key),
    releaseSafe(now),
  );
}
