import { v7 } from 'uuid';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Json } from '@/lib/protocol/canonical-json';
import type { Op } from '@/lib/protocol/op';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { type TestMember, type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { pushAs, wordsOf } from '@/tests/support/push/push-as';
import { type VisitIds, freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';
import { type WireOpInput, wireOp } from '@/tests/support/wire/wire-op';

let team: TestTeam;
let ids: VisitIds;

beforeAll(async () => {
  team = await makeTeam();
});

beforeEach(async () => {
  ids = freshIds();
  await push(openingOps(ids, 'N1'));
});

const push = (ops: readonly (Op | Json)[], by: TestMember = team.members.technician) => pushAs(team, by, ops);
const word = async (op: Op | Json, by?: TestMember) => wordsOf(await push([op], by))[0];
const egg = (more: Partial<WireOpInput> = {}) => ({ ...markOp(ids, { q: 0, r: 0, state: 'egg' }), ...more });
const about = (input: Partial<WireOpInput> & Pick<WireOpInput, 'kind'>) => wireOp({ ...ids, body: {}, ...input });
const retract = (target: string) => about({ kind: 'cell.retract', body: { target } });
const asideCount = (where: object = {}) =>
  database().models.QuarantinedOp.count({ where: { team_id: toBinary(team.teamId), ...where } });
const asideOf = (opId: string) =>
  database().models.QuarantinedOp.findAll({ where: { team_id: toBinary(team.teamId), op_id: toBinary(opId) } });

describe('the same id again', () => {
  it('in one batch is applied once (B13)', async () => {
    const op = egg();
    expect(wordsOf(await push([op, op]))).toEqual(['applied', 'duplicate']);
  });

  it('with another body is a conflict, and both bodies are kept (B14, I4)', async () => {
    const first = markOp(ids, { q: 0, r: 0, state: 'egg' });
    const second = wireOp({ kind: 'cell.mark', ...ids, opId: first.opId, body: { ...first.body, state: 'small' } });
    expect(wordsOf(await push([first, second]))).toEqual(['applied', 'conflict conflict']);
    expect(await word(second)).toBe('conflict conflict');
    const kept = await asideOf(first.opId);
    expect(kept.map(({ state, raw }) => [state, JSON.parse(raw) as Op])).toEqual([['conflict', second]]);
  });
});

describe('ids that do not fit', () => {
  it('opening a nest, visit or reading twice is set aside (exists)', async () => {
    for (const op of openingOps(ids, 'N2')) expect(await word(op)).toBe('quarantined exists');
  });

  it('a visit of another nest is no visit of this one (entity)', async () => {
    const other = freshIds();
    await push(openingOps(other, 'N3'));
    expect(
      await word(
        wireOp({
          kind: 'reading.open',
          nest: ids.nest,
          visit: other.visit,
          reading: v7(),
          body: { kind: 'field', source: 'phone' },
        }),
      ),
    ).toBe('quarantined entity');
    expect(await word(markOp({ ...ids, visit: other.visit }, { q: 0, r: 0, state: 'egg' }))).toBe('quarantined entity');
    expect(await word(markOp({ ...ids, nest: other.nest }, { q: 0, r: 0, state: 'egg' }))).toBe('quarantined entity');
  });

  it('an operation has to name what it is about (entity)', async () => {
    expect(await word(wireOp({ kind: 'nest.open', body: { code: 'N4' } }))).toBe('quarantined entity');
    expect(await word(wireOp({ kind: 'cell.retract', nest: ids.nest, body: { target: v7() } }))).toBe(
      'quarantined entity',
    );
    expect(
      await word(
        wireOp({
          kind: 'field.set',
          nest: ids.nest,
          body: { entity: 'visit', field: 'purpose', value: 'lab', base: null },
        }),
      ),
    ).toBe('quarantined entity');
    expect(await word(wireOp({ kind: 'step.mark', body: { step: 'carry', phase: 'mark' } }))).toBe(
      'quarantined entity',
    );
  });

  it('a reading may be opened by naming its visit alone', async () => {
    expect(
      await word(
        wireOp({ kind: 'reading.open', visit: ids.visit, reading: v7(), body: { kind: 'field', source: 'paper' } }),
      ),
    ).toBe('applied');
  });
});

describe('what has not arrived', () => {
  it.each(['nest', 'visit', 'reading'] as const)('an unknown %s parks the operation (B21)', async (name) => {
    expect(await word(markOp({ ...ids, [name]: v7() }, { q: 0, r: 0, state: 'egg' }))).toBe('parked deps');
  });

  it('an unknown dependency, target or base parks it', async () => {
    expect(await word(about({ kind: 'reading.submit', deps: [v7()] }))).toBe('parked deps');
    expect(await word(retract(v7()))).toBe('parked deps');
    expect(
      await word(about({ kind: 'field.set', body: { entity: 'nest', field: 'name', value: 'x', base: v7() } })),
    ).toBe('parked deps');
  });

  it('parked again it is kept once, however it is spelled', async () => {
    const op = retract(v7());
    const before = await asideCount();
    expect(wordsOf(await push([op, op]))).toEqual(['parked deps', 'parked deps']);
    const respelled = Object.fromEntries(Object.entries(op).reverse());
    expect(await word(respelled as Json)).toBe('parked deps');
    expect(await asideCount()).toBe(before + 1);
  });

  it('a circle of dependencies is set aside, what waits for it is parked (B22)', async () => {
    const [a, b] = [v7(), v7()];
    const ops = [
      about({ kind: 'reading.submit', opId: a, deps: [b] }),
      about({ kind: 'reading.submit', opId: b, deps: [a] }),
    ];
    expect(wordsOf(await push([...ops, about({ kind: 'reading.submit', deps: [a] })]))).toEqual([
      'quarantined deps',
      'quarantined deps',
      'parked deps',
    ]);
  });

  it('a circle through an operation that is parked already is found (B22)', async () => {
    const [a, b] = [v7(), v7()];
    expect(await word(about({ kind: 'reading.submit', opId: a, deps: [b] }))).toBe('parked deps');
    expect(await word(about({ kind: 'reading.submit', opId: b, deps: [a] }))).toBe('quarantined deps');
  });
});

describe('rights', () => {
  it('marking or submitting a reading somebody else opened is refused and not kept (I14)', async () => {
    const before = await asideCount();
    for (const by of [team.members.technician2, team.members.reviewer, team.members.biologist]) {
      expect(await word(egg({ opId: v7() }), by)).toBe('refused right');
      expect(await word(about({ kind: 'reading.submit' }), by)).toBe('refused right');
    }
    expect(await asideCount()).toBe(before);
  });

  it('a mark is taken back by who made it, a reviewer or the lead biologist; by nobody else (B43)', async () => {
    const { technician2, reviewer, biologist } = team.members;
    const marks = [egg({ opId: v7() }), egg({ opId: v7() }), egg({ opId: v7() })];
    await push(marks);
    const [first, second, third] = marks.map(({ opId }) => retract(opId));
    if (!first || !second || !third) throw new Error('three retractions');
    expect(await word(first, technician2)).toBe('refused right');
    expect(await word(first)).toBe('applied');
    expect(await word(second, reviewer)).toBe('applied');
    expect(await word(third, biologist)).toBe('applied');
  });

  it('an operation of an unknown kind from a technician waits for a newer server (B45)', async () => {
    expect(await word(about({ kind: 'review.decide' }))).toBe('parked newer');
  });
});

describe('retractions', () => {
  it('of a mark already taken back are set aside (B44)', async () => {
    const mark = egg();
    const [once, twice] = [retract(mark.opId), retract(mark.opId)];
    expect(wordsOf(await push([mark, once, twice]))).toEqual(['applied', 'applied', 'quarantined retracted']);
    expect(await word(retract(mark.opId))).toBe('quarantined retracted');
  });

  it('of a retraction, of another reading’s mark, of no mark are set aside (B44)', async () => {
    const mark = egg();
    const gone = retract(mark.opId);
    await push([mark, gone]);
    expect(await word(retract(gone.opId))).toBe('quarantined target');
    const other = freshIds();
    const opening = openingOps(other, 'N5');
    const elsewhere = markOp(other, { q: 0, r: 0, state: 'egg' });
    await push([...opening, elsewhere]);
    expect(await word(retract(elsewhere.opId))).toBe('quarantined target');
    expect(await word(retract(opening[0]?.opId ?? ''))).toBe('quarantined target');
  });
});

describe('what is set aside', () => {
  it('is kept whole, whatever it is', async () => {
    const junk: Json[] = [null, 5, 'text', [1], {}, { opId: 'x'.repeat(200) }];
    expect(new Set(wordsOf(await push(junk)))).toEqual(new Set(['quarantined shape']));
    const rows = await database().models.QuarantinedOp.findAll({
      where: { team_id: toBinary(team.teamId), code: 'shape' },
    });
    expect(rows.map(({ raw }) => raw).sort()).toEqual(junk.map((value) => JSON.stringify(value)).sort());
  });

  it('does not hold up the rest of its batch, and results follow the request (I11)', async () => {
    const good = egg();
    const results = await push([{ junk: true }, good, { ...egg(), bodyHash: 'wrong' } as Op, null]);
    expect(wordsOf(results)).toEqual(['quarantined shape', 'applied', 'quarantined hash', 'quarantined shape']);
    expect(results.map(({ opId }) => opId)).toEqual([null, good.opId, expect.any(String), null]);
    expect(results.map(({ bodyHash }) => bodyHash)).toEqual([null, good.bodyHash, 'wrong', null]);
    expect(results.map((result) => 'seq' in result)).toEqual([false, true, false, false]);
  });
});
