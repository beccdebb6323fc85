import { describe, expect, test } from 'vitest';
import { bringIn, isOwnFile } from '@/lib/offline/bring-in';
import { dexieStore, emptyIfCopied } from '@/lib/offline/dexie-store';
import type { Person } from '@/lib/offline/session-view';
import { freshDatabase } from '@/tests/support/sim/fresh-database';
import { ME, READING, VISIT, id, meta, op, row } from '@/tests/support/sim/local-ops';

const NOW = 2_000_000;

const mark = (n: number, hlc = `${1_000 + n}.0`) =>
  op({ kind: 'cell.mark', n, hlc, visit: VISIT, reading: READING, body: { q: n, r: 0, state: 'egg' } });

const fileOf = (...ops: ReturnType<typeof mark>[]) => ({
  ops: ops.map((each) => ({ state: 'queued', code: null, op: each })),
});

async function otherPhone() {
  const db = freshDatabase();
  const store = dexieStore(db);
  await store.found(meta());
  return { db, store };
}

describe('taking in a copy of unsent work', () => {
  test('queues every operation as it was made, in its order', async () => {
    const { store } = await otherPhone();
    expect(await bringIn(store, fileOf(mark(6), mark(4), mark(5)), NOW)).toEqual({ added: 3, known: 0 });
    const queued = await store.queued(10);
    expect(queued.map((each) => each.op)).toEqual([mark(4), mark(5), mark(6)]);
    expect(queued.map(({ actor }) => actor)).toEqual([ME, ME, ME]);
  });

  test('twice changes nothing, and what the office has already is not queued again', async () => {
    const { store } = await otherPhone();
    await bringIn(store, fileOf(mark(4), mark(5)), NOW);
    await store.transact([], () => ({ result: null, ops: [row(mark(4), { state: 'held', seq: 7 })] }));
    expect(await bringIn(store, fileOf(mark(4), mark(5), mark(6)), NOW)).toEqual({ added: 1, known: 2 });
    expect((await store.queued(10)).map(({ key }) => key)).toEqual([id(5), id(6)]);
  });

  test('takes more than fits in one transaction', async () => {
    const { store } = await otherPhone();
    const many = Array.from({ length: 450 }, (_, index) => mark(index + 1));
    expect(await bringIn(store, fileOf(...many), NOW)).toEqual({ added: 450, known: 0 });
    expect((await store.counts()).queued).toBe(450);
  });

  test('numbers and times what comes next after it, but follows no clock that ran far ahead', async () => {
    const { store } = await otherPhone();
    await bringIn(store, fileOf(mark(40, '1999000.3')), NOW);
    expect(await store.readMeta()).toMatchObject({ n: 40, hlc: '1999000.3' });
    await bringIn(store, fileOf(mark(41, `${NOW + 3_600_000}.0`)), NOW);
    expect(await store.readMeta()).toMatchObject({ n: 41, hlc: '1999000.3' });
  });

  test('is for the person who recorded it, in their team', () => {
    const person = { teamId: 'team', userId: ME } as Person;
    expect(isOwnFile({ teamId: 'team', userId: ME }, person)).toBe(true);
    expect(isOwnFile({ teamId: 'team', userId: 'another' }, person)).toBe(false);
    expect(isOwnFile({ teamId: 'another', userId: ME }, person)).toBe(false);
  });
});

describe('deleting what a copy was made of', () => {
  const ROWS = [
    row(mark(1), { state: 'remote' }),
    row(mark(2), { state: 'held' }),
    row(mark(3)),
    row(mark(4), { state: 'refused' }),
  ];

  test('empties the records when the copy has everything that is needed', async () => {
    const { db, store } = await otherPhone();
    await store.transact([], () => ({ result: null, ops: ROWS }));
    expect(await emptyIfCopied(db, new Set([id(2), id(3), id(4)]))).toBe(true);
    expect(await db.ops.count()).toBe(0);
    expect(await store.readMeta()).toBeNull();
  });

  test.each([2, 3, 4])('deletes nothing when operation %i came after the copy', async (missing) => {
    const { db, store } = await otherPhone();
    await store.transact([], () => ({ result: null, ops: ROWS }));
    const copied = new Set([2, 3, 4].filter((n) => n !== missing).map(id));
    expect(await emptyIfCopied(db, copied)).toBe(false);
    expect(await db.ops.count()).toBe(4);
    expect(await store.readMeta()).not.toBeNull();
  });
});
