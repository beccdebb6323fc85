import { describe, expect, test } from 'vitest';
import { foldFields, foldNote } from '@/lib/offline/fold-fields';
import { foldNests } from '@/lib/offline/fold-nests';
import { foldMarks, foldReading, foldReadings, liveByCell } from '@/lib/offline/fold-readings';
import { type LocalOp, officeKey } from '@/lib/offline/local-op';
import type { Json } from '@/lib/protocol/canonical-json';
import { ME, NEST, OTHER, READING, VISIT, id, row } from '@/tests/support/sim/local-ops';

const AT_OFFICE: Partial<LocalOp> = { state: 'held', outcome: 'applied' };
const THEIRS: Partial<LocalOp> = { state: 'remote', outcome: 'applied', actor: OTHER };

const within = { visit: VISIT, reading: READING };

const nest = (n: number, code: string, part?: Partial<LocalOp>) => row({ kind: 'nest.open', n, body: { code } }, part);

function visit(n: number, startedAt: string, part: Partial<LocalOp> = {}): LocalOp {
  const input = { kind: 'visit.open', n, visit: part.visit ?? VISIT, body: { purpose: 'check', startedAt } };
  return row(input, part);
}

function reading(n: number, kind = 'field', part: Partial<LocalOp> = {}): LocalOp {
  const body = { kind, source: 'phone' };
  return row({ kind: 'reading.open', n, visit: VISIT, reading: part.reading ?? READING, body }, part);
}

/** A mark at (q, 0); `more` is its state and what else it says. */
function mark(n: number, [q, state]: [number, string], part: Partial<LocalOp> & { supersedes?: string } = {}): LocalOp {
  const { supersedes, ...rest } = part;
  const body = { q, r: 0, state, nectar: false, unsure: false, ...(supersedes ? { supersedes } : {}) };
  return row({ kind: 'cell.mark', n, ...within, body }, rest);
}

const retract = (n: number, target: number) =>
  row({ kind: 'cell.retract', n, ...within, body: { target: id(target) } });

const setField = (n: number, body: { [key: string]: Json }) =>
  row({ kind: 'field.set', n, body: { entity: 'nest', field: 'name', base: null, ...body } });

const set = (n: number, value: Json, base: Json = null) => setField(n, { value, base });

describe('a field', () => {
  test('has the value of the edit that nobody has edited further', () => {
    expect(foldFields([set(1, 'a'), set(2, 'b', id(1))], NEST).get('name')).toEqual({
      value: 'b',
      opId: id(2),
      others: [],
    });
  });

  test('keeps both values when two people changed it apart, the newer one first', () => {
    expect(foldFields([set(1, 'a'), set(3, 'c', id(1)), set(2, 'b', id(1))], NEST).get('name')).toEqual({
      value: 'c',
      opId: id(3),
      others: [{ value: 'b', opId: id(2) }],
    });
  });

  test('is settled by an edit that names both', () => {
    const rows = [set(1, 'a'), set(2, 'b'), set(3, 'both', [id(1), id(2)])];
    expect(foldFields(rows, NEST).get('name')).toMatchObject({ value: 'both', others: [] });
  });

  test('of another entity is left out; a note is a field of its own', () => {
    const note = row({ kind: 'note.set', n: 4, visit: VISIT, body: { entity: 'visit', text: 'windy', base: null } });
    const rows = [set(1, 'a'), note];
    expect(foldFields(rows, VISIT).size).toBe(0);
    expect(foldNote(rows, VISIT)).toMatchObject({ value: 'windy' });
    expect(foldNote(rows, NEST)).toBeNull();
  });
});

describe('a reading', () => {
  const summary = (rows: LocalOp[]) => foldReadings(rows, ME)[0];

  test('draws its live marks: a mark replaces another, a retraction brings that back', () => {
    const rows = [
      mark(1, [0, 'egg']),
      mark(2, [1, 'small']),
      mark(3, [0, 'medium'], { supersedes: id(1) }),
      retract(4, 3),
    ];
    const live = liveByCell(foldMarks(rows));
    expect([...live.values()].map(({ q, state }) => [q, state])).toEqual([
      [0, 'egg'],
      [1, 'small'],
    ]);
  });

  test('tells for each mark how far it has come', () => {
    const rows = [
      reading(1, 'field', AT_OFFICE),
      mark(2, [0, 'egg'], AT_OFFICE),
      mark(3, [1, 'egg']),
      mark(4, [2, 'egg'], { state: 'refused' }),
      mark(5, [3, 'egg'], { state: 'held', outcome: 'quarantined' }),
      mark(6, [4, 'egg'], { state: 'suspect' }),
    ];
    const found = summary(rows);
    if (!found) throw new Error('no reading');
    const view = foldReading(found, rows);
    expect(view.marks.map(({ standing }) => standing)).toEqual([
      'at-office',
      'waiting',
      'not-accepted',
      'not-accepted',
      'waiting',
    ]);
    expect(view.tally).toMatchObject({ cellsTotal: 5, egg: 5 });
  });

  test('tells its history in words, newest first', () => {
    const rows = [reading(1), mark(2, [0, 'egg']), mark(3, [1, 'small']), retract(4, 3)];
    const found = summary(rows);
    if (!found) throw new Error('no reading');
    expect(foldReading(found, rows).history.map(({ words }) => words)).toEqual([
      'Cell 3: small larva, taken back',
      'Cell 3: small larva',
      'Cell 0: egg',
    ]);
  });

  test('leaves out a mark that this version cannot draw', () => {
    expect(foldMarks([mark(1, [0, 'spun']), mark(2, [99, 'egg']), mark(3, [0.5, 'egg'])]).marks).toEqual([]);
  });

  test('shows the office row where that contradicts an operation of this phone', () => {
    const ours = mark(1, [0, 'egg'], { state: 'held', outcome: 'conflict' });
    const theirs = mark(1, [0, 'capped'], { ...THEIRS, key: officeKey(id(1)) });
    expect(foldMarks([ours, theirs]).marks.map(({ state }) => state)).toEqual(['capped']);
  });

  test('of someone else is hidden from a second reader until they have handed in', () => {
    const mine = reading(2, 'second', { reading: id(50) });
    const rows = [reading(1, 'field', THEIRS), mine, mark(3, [0, 'egg'], THEIRS)];
    const hidden = summary(rows);
    expect(hidden).toMatchObject({ mine: false, blind: true });
    if (hidden) expect(foldReading(hidden, rows)).toMatchObject({ marks: [], tally: { cellsTotal: 0 }, history: [] });
    const handedIn = row({ kind: 'reading.submit', n: 4, visit: VISIT, reading: id(50) });
    expect(summary([...rows, handedIn])).toMatchObject({ blind: false });
    expect(foldReadings(rows, ME)[1]).toMatchObject({ mine: true, blind: false });
  });
});

describe('the nests', () => {
  test('are sorted by their last visit, and count visits, readings and what waits', () => {
    const other = { nest: 'another-nest' };
    const rows = [
      nest(1, 'N01', AT_OFFICE),
      visit(2, '2026-06-01T09:00:00-04:00', AT_OFFICE),
      reading(3),
      { ...nest(4, 'N02', THEIRS), ...other },
      { ...visit(5, '2026-06-02T09:00:00-04:00', { ...THEIRS, visit: id(51) }), ...other },
    ];
    expect(
      foldNests(rows, ME).map(({ code, visits, lastReadingId, waiting, standing }) => [
        code,
        visits,
        lastReadingId,
        waiting,
        standing,
      ]),
    ).toEqual([
      ['N02', 1, null, 0, 'at-office'],
      ['N01', 1, READING, 1, 'waiting'],
    ]);
  });

  test('compare visits as instants, whatever offsets they were written with', () => {
    const early = visit(2, '2026-06-02T01:00:00+02:00', { visit: id(51) });
    const late = visit(3, '2026-06-01T20:00:00-04:00', { visit: id(52) });
    expect(foldNests([nest(1, 'N01'), late, early], ME)[0]?.visitList.map(({ id: found }) => found)).toEqual([
      id(51),
      id(52),
    ]);
  });

  test('show what was set later before what they were opened with, also when it was cleared', () => {
    const opening = row({
      kind: 'nest.open',
      n: 1,
      body: { code: 'N01', name: 'Boat house', place: { lat: 43.6, lon: -77.6 } },
    });
    expect(foldNests([opening], ME)[0]).toMatchObject({
      name: 'Boat house',
      place: { lat: 43.6, lon: -77.6, accuracyM: null },
    });
    expect(foldNests([opening, set(2, 'Oar rack')], ME)[0]).toMatchObject({ name: 'Oar rack' });
    expect(foldNests([opening, set(2, null), setField(3, { value: null, field: 'place' })], ME)[0]).toMatchObject({
      name: null,
      place: null,
    });
  });

  test('are archived by an operation, not removed', () => {
    const archive = row({ kind: 'entity.archive', n: 2, body: { entity: 'nest' } });
    expect(foldNests([nest(1, 'N01'), archive], ME)[0]?.archived).toBe(true);
  });

  test('come out the same whatever the order of their operations', () => {
    const rows = [nest(1, 'N01'), visit(2, '2026-06-01T09:00:00-04:00'), reading(3), set(4, 'a'), set(5, 'b', id(4))];
    expect(foldNests([...rows].reverse(), ME)).toEqual(foldNests(rows, ME));
  });
});
