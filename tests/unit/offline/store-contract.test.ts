import { describe, expect, test } from 'vitest';
import { dexieStore } from '@/lib/offline/dexie-store';
import type { LocalOp } from '@/lib/offline/local-op';
import { startPlace } from '@/lib/offline/recorder-state';
import type { Store } from '@/lib/offline/store';
import { freshDatabase } from '@/tests/support/sim/fresh-database';
import { NEST, READING, meta, row } from '@/tests/support/sim/local-ops';
import { MemoryDisk } from '@/tests/support/sim/memory-disk';
import { memoryStore } from '@/tests/support/sim/memory-store';

const STORES = [
  { name: 'in memory', make: () => memoryStore(new MemoryDisk()) },
  { name: 'in IndexedDB', make: () => dexieStore(freshDatabase()) },
];

const mark = (n: number, part: Partial<LocalOp> = {}) => row({ kind: 'cell.mark', n, reading: READING }, part);

async function filled(store: Store, rows: readonly LocalOp[]): Promise<Store> {
  await store.found(meta());
  await store.transact([], () => ({ result: null, ops: rows }));
  return store;
}

const keys = (rows: readonly LocalOp[]) => rows.map((found) => found.n);

describe.each(STORES)('the storage $name', ({ make }) => {
  test('has no meta row until it is founded, and is founded once', async () => {
    const store = make();
    expect(await store.readMeta()).toBeNull();
    expect((await store.found(meta({ sentinel: 'first' }))).sentinel).toBe('first');
    expect((await store.found(meta({ sentinel: 'second' }))).sentinel).toBe('first');
    expect((await store.readMeta())?.sentinel).toBe('first');
  });

  test('shows a transaction its meta row and the operations it names', async () => {
    const store = await filled(make(), [mark(1), mark(2)]);
    const seen = await store.transact([mark(2).key, 'unknown'], (before) => ({ result: before }));
    expect(seen.meta).toEqual(meta());
    expect([...seen.ops.values()]).toEqual([mark(2)]);
  });

  test('writes operations, meta row and place together', async () => {
    const store = await filled(make(), []);
    const place = { ...startPlace(READING), skipped: ['1,0'] };
    await store.transact([], () => ({ result: null, ops: [mark(1)], meta: meta({ n: 1 }), place }));
    expect(await store.queued(9)).toEqual([mark(1)]);
    expect((await store.readMeta())?.n).toBe(1);
    expect(await store.place(READING)).toEqual(place);
    expect(await store.place('another')).toBeNull();
  });

  test('writes nothing when the change throws', async () => {
    const store = await filled(make(), []);
    const failing = store.transact([], () => {
      throw new RangeError('no');
    });
    await expect(failing).rejects.toThrow(RangeError);
    expect(await store.counts()).toEqual({ queued: 0, suspect: 0, refused: 0, setAside: 0 });
  });

  test('gives the queue by number', async () => {
    const store = await filled(make(), [mark(3), mark(1), mark(2, { state: 'held' }), mark(10)]);
    expect(keys(await store.queued(2))).toEqual([1, 3]);
    expect(keys(await store.queued(9))).toEqual([1, 3, 10]);
  });

  test('gives held operations by key and by sequence', async () => {
    const held = [1, 2, 3].map((n) => mark(n, { state: 'held', seq: 10 * n }));
    const store = await filled(make(), [...held, mark(4, { state: 'held' }), mark(5)]);
    expect(keys(await store.heldAfter('', 2))).toEqual([1, 2]);
    expect(keys(await store.heldAfter(mark(2).key, 9))).toEqual([3, 4]);
    expect(keys(await store.heldUpTo(20, 9))).toEqual([1, 2]);
  });

  test('counts what waits and what needs a person', async () => {
    const store = await filled(make(), [
      mark(1),
      mark(2, { state: 'suspect' }),
      mark(3, { state: 'refused' }),
      mark(4, { state: 'refused', seen: true }),
      mark(5, { state: 'held', outcome: 'quarantined' }),
      mark(6, { state: 'held', outcome: 'conflict', seen: true }),
      mark(7, { state: 'held', outcome: 'parked' }),
      mark(8, { state: 'remote' }),
    ]);
    expect(await store.counts()).toEqual({ queued: 1, suspect: 1, refused: 1, setAside: 1 });
    expect(keys(await store.inState('refused', 9))).toEqual([3, 4]);
    expect(keys(await store.inState('suspect', 9))).toEqual([2]);
  });

  test('drops the office rows of other epochs and nothing else', async () => {
    const rows = [
      mark(1, { state: 'remote', epoch: 1 }),
      mark(2, { state: 'remote', epoch: 2 }),
      mark(3, { state: 'held', epoch: 1 }),
      mark(4),
    ];
    const store = await filled(make(), rows);
    await store.transact([], () => ({ result: null, keepEpoch: 2 }));
    expect(keys(await store.opsOfReading(READING)).sort((a, b) => a - b)).toEqual([2, 3, 4]);
  });

  test('finds the operations of a reading and of a nest', async () => {
    const store = await filled(make(), [
      mark(1),
      row({ kind: 'nest.open', n: 2 }),
      row({ kind: 'nest.open', n: 3, nest: 'other' }),
    ]);
    expect(keys(await store.opsOfReading(READING))).toEqual([1]);
    expect(keys(await store.opsOfNest(NEST)).sort((a, b) => a - b)).toEqual([1, 2]);
  });

  test('hands the lease to its change and keeps what that returns', async () => {
    const store = make();
    const mine = { holder: 'me', until: 9 };
    expect(await store.lease((before) => (before === null ? mine : null))).toEqual(mine);
    expect(await store.lease((before) => before)).toEqual(mine);
    expect(await store.lease(() => null)).toBeNull();
  });

  test('goes on after it was reopened', async () => {
    const store = await filled(make(), [mark(1)]);
    await store.reopen();
    await store.probe();
    expect(keys(await store.queued(9))).toEqual([1]);
  });
});
