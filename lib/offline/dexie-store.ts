import { Dexie } from 'dexie';
import type { RecordsDatabase } from './dexie-database';
import type { Lease } from './lease-row';
import type { LocalOp } from './local-op';
import type { Change, OpCounts, Snapshot, Store, StoreMeta } from './store';

const ONLY = 'only';

/** The meta row; null when there is none. */
export async function readMeta(db: RecordsDatabase): Promise<StoreMeta | null> {
  return (await db.meta.get(ONLY))?.value ?? null;
}

async function read(db: RecordsDatabase, keys: readonly string[]): Promise<Snapshot> {
  const [meta, rows] = await Promise.all([readMeta(db), db.ops.bulkGet([...keys])]);
  const found = rows.filter((row) => row !== undefined);
  return { meta, ops: new Map(found.map((row) => [row.key, row])) };
}

async function write(db: RecordsDatabase, change: Change<unknown>): Promise<void> {
  const { meta, ops, place, keepEpoch } = change;
  if (ops && ops.length > 0) await db.ops.bulkPut([...ops]);
  if (place) await db.places.put(place);
  if (meta) await db.meta.put({ id: ONLY, value: meta });
  if (keepEpoch === undefined) return;
  const stale = (row: LocalOp) => row.epoch !== keepEpoch;
  await inState(db, 'remote', 'n').filter(stale).delete();
}

/** The operations in a state, in the order of another field. */
export function inState(db: RecordsDatabase, state: LocalOp['state'], order: 'n' | 'key' | 'seq') {
  return db.ops.where(`[state+${order}]`).between([state, Dexie.minKey], [state, Dexie.maxKey]);
}

/** How many operations stand where. */
export async function countOps(db: RecordsDatabase): Promise<OpCounts> {
  const unseen = (row: LocalOp) => row.state === 'held' && !row.seen;
  const [queued, suspect, refused, setAside] = await Promise.all([
    inState(db, 'queued', 'n').count(),
    inState(db, 'suspect', 'n').count(),
    inState(db, 'refused', 'n')
      .filter((row) => !row.seen)
      .count(),
    db.ops.where('outcome').anyOf('quarantined', 'conflict').filter(unseen).count(),
  ]);
  return { queued, suspect, refused, setAside };
}

async function changeLease(db: RecordsDatabase, change: (before: Lease | null) => Lease | null): Promise<Lease | null> {
  const after = change((await db.leases.get(ONLY))?.value ?? null);
  if (after) await db.leases.put({ id: ONLY, value: after });
  else await db.leases.delete(ONLY);
  return after;
}

/**
 * The storage port over IndexedDB. Every method awaits its transaction's own promise, which settles when the
 * transaction has completed or was aborted; the promises of single requests may claim success before an abort.
 */
export function dexieStore(db: RecordsDatabase): Store {
  return {
    transact: <T>(keys: readonly string[], change: (before: Snapshot) => Change<T>) =>
      db.transaction('rw', [db.ops, db.meta, db.places], async () => {
        const made = change(await read(db, keys));
        await write(db, made);
        return made.result;
      }),
    found: (meta) =>
      db.transaction('rw', [db.meta], async () => {
        const known = await readMeta(db);
        if (!known) await db.meta.put({ id: ONLY, value: meta });
        return known ?? meta;
      }),
    readMeta: () => readMeta(db),
    queued: (limit) => inState(db, 'queued', 'n').limit(limit).toArray(),
    inState: (state, limit) => inState(db, state, 'n').limit(limit).toArray(),
    heldAfter: (key, limit) =>
      db.ops.where('[state+key]').between(['held', key], ['held', Dexie.maxKey], false).limit(limit).toArray(),
    heldUpTo: (seq, limit) =>
      db.ops.where('[state+seq]').between(['held', 1], ['held', seq], true, true).limit(limit).toArray(),
    counts: () => db.transaction('r', [db.ops], () => countOps(db)),
    opsOfReading: (reading) => db.ops.where('reading').equals(reading).toArray(),
    opsOfNest: (nest) => db.ops.where('nest').equals(nest).toArray(),
    place: async (reading) => (await db.places.get(reading)) ?? null,
    lease: (change) => db.transaction('rw', [db.leases], () => changeLease(db, change)),
    probe: async () => {
      await db.meta.count();
    },
    reopen: async () => {
      if (db.isTakenOver) throw new Error('a newer version of the app has taken the storage over');
      db.close({ disableAutoOpen: false });
      await db.open();
    },
  };
}

/**
 * Empties a person's records in one transaction, but only when every operation that could still be needed is in a copy.
 *
 * @param copied the ids of the operations in that copy.
 * @returns false, with everything still there, when the copy lacks one.
 */
export function emptyIfCopied(db: RecordsDatabase, copied: ReadonlySet<string>): Promise<boolean> {
  return db.transaction('rw', db.tables, async () => {
    const missing = await db.ops.filter((row) => row.state !== 'remote' && !copied.has(row.op.opId)).count();
    if (missing > 0) return false;
    await Promise.all(db.tables.map((table) => table.clear()));
    return true;
  });
}
