import { IDBObjectStore } from 'fake-indexeddb';
import { describe, expect, test, vi } from 'vitest';
import { type CommitEntry, WATCHDOG_MS, commitOps } from '@/lib/offline/commit-op';
import { dexieStore } from '@/lib/offline/dexie-store';
import { NotSavedError, notSavedReason } from '@/lib/offline/not-saved';
import { startPlace } from '@/lib/offline/recorder-state';
import type { Store } from '@/lib/offline/store';
import { freshDatabase, freshIndexedDb } from '@/tests/support/sim/fresh-database';
import { READING, countingMaker, markDraft, meta } from '@/tests/support/sim/local-ops';
import { ManualTimers } from '@/tests/support/sim/manual-timers';
import { MemoryDisk } from '@/tests/support/sim/memory-disk';
import { memoryStore } from '@/tests/support/sim/memory-store';

async function onePress(): Promise<CommitEntry> {
  const draft = await markDraft(countingMaker(new ManualTimers()), { q: 0, r: 0, state: 'egg' });
  return { drafts: [draft], place: startPlace(READING) };
}

/** A fake transaction can be aborted with any error; a browser does that itself when the disk is full. */
interface Abortable {
  _abort(name: string): void;
}

function isAbortable(transaction: object): transaction is Abortable {
  return '_abort' in transaction;
}

/**
 * Lets every put report success and aborts the transaction for want of space after its last one: measured so in
 * Chromium near its quota.
 */
function fillDisk(times: number): { successes: number } {
  const seen = { successes: 0 };
  const put = IDBObjectStore.prototype.put;
  vi.spyOn(IDBObjectStore.prototype, 'put').mockImplementation(function (this: IDBObjectStore, value: unknown) {
    const request = put.call(this, value);
    if (this.name !== 'meta' || seen.successes >= times) return request;
    request.addEventListener('success', () => {
      seen.successes += 1;
      if (isAbortable(this.transaction)) this.transaction._abort('QuotaExceededError');
    });
    return request;
  });
  return seen;
}

describe('saving a press', () => {
  test('puts the operation and the place on the disk, with number and clock reading', async () => {
    const timers = new ManualTimers();
    const store = dexieStore(freshDatabase());
    await store.found(meta({ n: 41, hlc: `${timers.now() + 5}.2` }));
    const [saved] = await commitOps({ store, clock: timers, timers }, await onePress());
    expect(saved).toMatchObject({ n: 42, deviceId: 'device', hlc: `${timers.now() + 5}.3` });
    expect((await store.queued(9)).map((row) => row.op)).toEqual([saved]);
    expect(await store.place(READING)).toEqual(startPlace(READING));
    expect(await store.readMeta()).toMatchObject({ n: 42, hlc: saved?.hlc });
  });

  test('outlives the connection it was made on', async () => {
    const idb = freshIndexedDb();
    const timers = new ManualTimers();
    const first = freshDatabase(idb);
    await dexieStore(first).found(meta());
    await commitOps({ store: dexieStore(first), clock: timers, timers }, await onePress());
    first.close();
    expect(await dexieStore(freshDatabase(idb)).counts()).toMatchObject({ queued: 1 });
  });
});

describe('on a full disk, where a request succeeds before its transaction is aborted', () => {
  test('nothing is shown as saved, and the press is handed back', async () => {
    const timers = new ManualTimers();
    const store = dexieStore(freshDatabase());
    await store.found(meta());
    const entry = await onePress();
    const seen = fillDisk(Infinity);
    const error: unknown = await commitOps({ store, clock: timers, timers }, entry).catch((thrown: unknown) => thrown);
    expect(seen.successes).toBeGreaterThan(0);
    expect(error).toMatchObject({ name: 'NotSavedError', reason: 'full', drafts: entry.drafts });
    expect(await store.counts()).toMatchObject({ queued: 0 });
    expect((await store.readMeta())?.n).toBe(0);
  });

  test('a small press is saved once there is room again', async () => {
    const timers = new ManualTimers();
    const store = dexieStore(freshDatabase());
    await store.found(meta());
    fillDisk(2);
    expect(await commitOps({ store, clock: timers, timers }, await onePress())).toHaveLength(1);
    expect(await store.counts()).toMatchObject({ queued: 1 });
  });
});

/** A store whose transactions fail a number of times. */
function failing(error: unknown, times: number): { store: Store; disk: MemoryDisk; tries: () => number } {
  const disk = new MemoryDisk();
  disk.meta = meta();
  const right = memoryStore(disk);
  let tries = 0;
  const transact: Store['transact'] = (keys, change) => {
    tries += 1;
    return tries <= times ? Promise.reject(error) : right.transact(keys, change);
  };
  return { store: { ...right, transact }, disk, tries: () => tries };
}

describe('when the storage fails', () => {
  const dead = Object.assign(new Error('the connection is closing'), { name: 'InvalidStateError' });

  test('the connection is opened anew and the press is saved all the same', async () => {
    const timers = new ManualTimers();
    const { store, disk } = failing(dead, 3);
    const reopen = vi.spyOn(store, 'reopen');
    await commitOps({ store, clock: timers, timers }, await onePress());
    expect(reopen).toHaveBeenCalledTimes(3);
    expect(disk.ops.size).toBe(1);
  });

  test('a press that four attempts could not save says so and keeps its operation', async () => {
    const timers = new ManualTimers();
    const { store, tries } = failing(dead, 99);
    const entry = await onePress();
    const error: unknown = await commitOps({ store, clock: timers, timers }, entry).catch((thrown: unknown) => thrown);
    expect(error).toBeInstanceOf(NotSavedError);
    expect(error).toMatchObject({ reason: 'storage', drafts: entry.drafts });
    expect(tries()).toBe(4);
  });

  test('storage that was emptied is not tried again', async () => {
    const timers = new ManualTimers();
    const disk = new MemoryDisk();
    const press = commitOps({ store: memoryStore(disk), clock: timers, timers }, await onePress());
    await expect(press).rejects.toMatchObject({ reason: 'cleared' });
    expect(disk.ops.size).toBe(0);
  });

  test('a transaction that hangs is given up by the watchdog, and a late success does not double the press', async () => {
    const timers = new ManualTimers();
    const disk = new MemoryDisk();
    disk.meta = meta();
    const right = memoryStore(disk);
    let first = true;
    const transact: Store['transact'] = async (keys, change) => {
      const result = await right.transact(keys, change);
      const hangs = first;
      first = false;
      return hangs ? new Promise(() => undefined) : result;
    };
    const press = commitOps({ store: { ...right, transact }, clock: timers, timers }, await onePress());
    await timers.pass(WATCHDOG_MS);
    expect(await press).toHaveLength(1);
    expect(disk.ops.size).toBe(1);
    expect(disk.meta.n).toBe(1);
  });
});

describe('the reason why something is not saved', () => {
  const named = (name: string, inner?: unknown) => Object.assign(new Error(name), { name, inner });

  test('is a full disk, by the name of the error or of the error inside an abort', () => {
    expect(notSavedReason(named('QuotaExceededError'))).toBe('full');
    expect(notSavedReason(named('AbortError', named('QuotaExceededError')))).toBe('full');
  });

  test('is the storage for everything that has no better name', () => {
    for (const error of [named('AbortError'), named('UnknownError'), null, 'text', undefined]) {
      expect(notSavedReason(error)).toBe('storage');
    }
  });
});
