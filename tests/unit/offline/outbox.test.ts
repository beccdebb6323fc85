import { describe, expect, test } from 'vitest';
import { acknowledge } from '@/lib/offline/acknowledge';
import { dexieStore } from '@/lib/offline/dexie-store';
import type { LocalOp } from '@/lib/offline/local-op';
import { readOutbox, readUnbacked, readUnsent } from '@/lib/offline/read-outbox';
import { readNest, readNests, readReading, readVisit } from '@/lib/offline/read-records';
import { freshDatabase } from '@/tests/support/sim/fresh-database';
import { ME, NEST, READING, VISIT, id, meta, row } from '@/tests/support/sim/local-ops';

const mark = (n: number, part: Partial<LocalOp> = {}) =>
  row({ kind: 'cell.mark', n, visit: VISIT, reading: READING, body: { q: n, r: 0, state: 'egg' } }, part);

const ROWS = [
  row({ kind: 'nest.open', n: 1, body: { code: 'N01' } }, { state: 'held', outcome: 'applied' }),
  row(
    { kind: 'visit.open', n: 2, visit: VISIT, body: { purpose: 'check', startedAt: '2026-06-16T05:35:00-04:00' } },
    { state: 'held' },
  ),
  row(
    { kind: 'reading.open', n: 3, visit: VISIT, reading: READING, body: { kind: 'field', source: 'phone' } },
    { state: 'held' },
  ),
  mark(4),
  mark(5, { state: 'suspect' }),
  mark(6, { state: 'refused', code: 'right' }),
  mark(7, { state: 'held', outcome: 'quarantined', code: 'value' }),
  mark(8, { state: 'held', outcome: 'parked' }),
  mark(9, { state: 'remote' }),
];

async function phone() {
  const db = freshDatabase();
  const store = dexieStore(db);
  await store.found(meta());
  await store.transact([], () => ({ result: null, ops: ROWS }));
  return { db, store };
}

describe('the outbox', () => {
  test('lists what waits and what needs a person, each with a reason', async () => {
    const { db } = await phone();
    const { waiting, queue, attention } = await readOutbox(db);
    expect(waiting).toBe(1);
    expect(queue.map(({ words }) => words)).toEqual(['Cell 45: egg']);
    expect(attention.map(({ opId, why, code }) => [opId, why, code])).toEqual([
      [id(6), 'refused', 'right'],
      [id(5), 'suspect', null],
      [id(7), 'set-aside', 'value'],
    ]);
  });

  test('asks for nobody any more once a person has looked, and still lists it', async () => {
    const { db, store } = await phone();
    expect(await store.counts()).toMatchObject({ refused: 1, setAside: 1 });
    await acknowledge(store, [id(6), id(7)]);
    expect(await store.counts()).toMatchObject({ refused: 0, setAside: 0, suspect: 1 });
    expect((await readOutbox(db)).attention).toHaveLength(3);
  });

  test('gives what a copy needs: everything unsent, and before a deletion everything the backup may lack', async () => {
    const { db } = await phone();
    const numbers = (rows: readonly LocalOp[]) => rows.map(({ n }) => n).sort((a, b) => a - b);
    expect(numbers(await readUnsent(db))).toEqual([4, 5, 6, 7]);
    expect(numbers(await readUnbacked(db))).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
  });
});

describe('the records', () => {
  test('are read from the phone: nests, one nest, one visit, one reading', async () => {
    const { db } = await phone();
    expect(await readNests(db, ME)).toMatchObject([{ code: 'N01', visits: 1, waiting: 2, lastReadingId: READING }]);
    expect(await readNest(db, ME, NEST)).toMatchObject({
      visitList: [{ id: VISIT, readings: [{ id: READING, mine: true }] }],
    });
    expect(await readVisit(db, ME, VISIT)).toMatchObject({ purpose: 'check', startedAt: '2026-06-16T05:35:00-04:00' });
    expect(await readReading(db, ME, READING)).toMatchObject({ tally: { cellsTotal: 6 } });
  });

  test('that are not on this phone are null', async () => {
    const { db } = await phone();
    expect(await readNest(db, ME, 'no')).toBeNull();
    expect(await readVisit(db, ME, 'no')).toBeNull();
    expect(await readReading(db, ME, 'no')).toBeNull();
  });
});
