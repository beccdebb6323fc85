import { describe, expect, test } from 'vitest';
import { acknowledge } from '@/lib/offline/acknowledge';
import { dexieStore } from '@/lib/offline/dexie-store';
import { exportUnsent } from '@/lib/offline/export-unsent';
import type { LocalOp } from '@/lib/offline/local-op';
import { readOutbox, readUnsent } from '@/lib/offline/read-outbox';
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

  test('is exported whole, with what could not be saved', async () => {
    const { db } = await phone();
    const rows = await readUnsent(db);
    expect(rows.map(({ n }) => n).sort((a, b) => a - b)).toEqual([4, 5, 6, 7]);
    const person = {
      teamId: 't',
      teamName: 'T',
      userId: ME,
      displayName: 'Me',
      role: 'technician',
      zone: 'UTC',
      members: [],
    } as const;
    const { bodyHash: _hash, ...draft } = mark(11).op;
    const text = exportUnsent({
      person: { ...person, members: [] },
      exportedAt: '2026-06-16T09:41:00.000Z',
      rows,
      notSaved: [draft],
    });
    const file: { ops: { op: unknown; state: string }[]; notSaved: unknown[] } = JSON.parse(text);
    expect(file.ops.map(({ op }) => op)).toEqual(rows.map(({ op }) => op));
    expect(file.notSaved).toEqual([draft]);
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
