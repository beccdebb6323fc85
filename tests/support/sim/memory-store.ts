import type { LocalOp } from '@/lib/offline/local-op';
import type { OpCounts, Store } from '@/lib/offline/store';
import type { MemoryDisk } from './memory-disk';

/** How a simulated disk takes its time and fails. `work` runs at one instant between two waits, or never. */
export type DiskRun = <T>(work: () => T) => Promise<T>;

/**
 * A disk that is never slow and never fails.
 *
 * @public The tests that plant faults take it from the module they replace.
 */
export const steadyDisk: DiskRun = async (work) => work();

function isSetAside({ state, outcome, seen }: LocalOp): boolean {
  return state === 'held' && !seen && (outcome === 'quarantined' || outcome === 'conflict');
}

function countOps(disk: MemoryDisk): OpCounts {
  const counts = { queued: 0, suspect: 0, refused: 0, setAside: 0 };
  for (const row of disk.ops.values()) {
    if (row.state === 'queued') counts.queued += 1;
    else if (row.state === 'suspect') counts.suspect += 1;
    else if (row.state === 'refused' && !row.seen) counts.refused += 1;
    else if (isSetAside(row)) counts.setAside += 1;
  }
  return counts;
}

/** The storage port over a `MemoryDisk`: one per tab, several may share a disk. */
export function memoryStore(disk: MemoryDisk, run: DiskRun = steadyDisk): Store {
  const all = () => [...disk.ops.values()];
  return {
    transact: (keys, change) =>
      run(() => {
        const made = change(disk.snapshot(keys));
        disk.write(made);
        return made.result;
      }),
    found: (meta) => run(() => (disk.meta ??= meta)),
    readMeta: () => run(() => disk.meta),
    queued: (limit) =>
      run(() =>
        disk.select(
          (row) => row.state === 'queued',
          (row) => row.n,
          limit,
        ),
      ),
    inState: (state, limit) =>
      run(() =>
        disk.select(
          (row) => row.state === state,
          (row) => row.n,
          limit,
        ),
      ),
    heldAfter: (key, limit) =>
      run(() =>
        disk.select(
          (row) => row.state === 'held' && row.key > key,
          (row) => row.key,
          limit,
        ),
      ),
    heldUpTo: (seq, limit) =>
      run(() =>
        disk.select(
          (row) => row.state === 'held' && row.seq > 0 && row.seq <= seq,
          (row) => row.seq,
          limit,
        ),
      ),
    counts: () => run(() => countOps(disk)),
    opsOfReading: (reading) => run(() => all().filter((row) => row.reading === reading)),
    opsOfNest: (nest) => run(() => all().filter((row) => row.nest === nest)),
    place: (reading) => run(() => disk.places.get(reading) ?? null),
    lease: (change) => run(() => (disk.lease = change(disk.lease))),
    probe: () => run(() => undefined),
    reopen: () => run(() => undefined),
  };
}
