import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import type { Json } from '@/lib/protocol/canonical-json';
import type { Op } from '@/lib/protocol/op';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { pushAs, wordsOf } from '@/tests/support/push/push-as';
import { type VisitIds, freshIds, openingOps } from '@/tests/support/wire/first-visit';
import { wireOp } from '@/tests/support/wire/wire-op';

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

async function opened(): Promise<VisitIds & { opening: Op }> {
  const ids = freshIds();
  const ops = openingOps(ids, 'N1');
  await pushAs(team, team.members.technician, ops);
  return { ...ids, opening: ops[0] as Op };
}

interface Setting {
  field: string;
  value: Json;
  base?: Json;
  hlc?: string;
  entity?: string;
}

function set(ids: VisitIds, { field, value, base = null, hlc = '1781602867120.1', entity = 'nest' }: Setting): Op {
  const { nest, visit, reading } = ids;
  return wireOp({ kind: 'field.set', nest, visit, reading, hlc, body: { entity, field, value, base } });
}

async function words(...ops: Op[]) {
  return wordsOf(await pushAs(team, team.members.technician2, ops));
}

async function nestOf(ids: VisitIds) {
  return database().models.Nest.findOne({
    where: { team_id: toBinary(team.teamId), id: toBinary(ids.nest) },
    rejectOnEmpty: true,
  });
}

async function flagOf({ opId }: Op): Promise<string | undefined> {
  return (await database().models.Op.findOne({ where: { team_id: toBinary(team.teamId), op_id: toBinary(opId) } }))
    ?.flags;
}

describe('a field', () => {
  it('shows what was set last from what was shown', async () => {
    const ids = await opened();
    const first = set(ids, { field: 'name', value: 'Boat house' });
    const second = set(ids, { field: 'name', value: 'Boathouse', base: first.opId });
    expect(await words(first, second)).toEqual(['applied', 'applied']);
    expect((await nestOf(ids)).name).toBe('Boathouse');
    expect(await flagOf(second)).toBe('');
  });

  it('set by two people from the same value shows the later clock and flags the conflict, also when pushed apart', async () => {
    const ids = await opened();
    const late = set(ids, { field: 'name', value: 'late', hlc: '1781602867120.9' });
    const early = set(ids, { field: 'name', value: 'early', hlc: '1781602867120.2' });
    await words(late);
    await words(early);
    expect((await nestOf(ids)).name).toBe('late');
    expect([await flagOf(late), await flagOf(early)]).toEqual(['', 'conflict']);
  });

  it('in conflict is settled by one that names both', async () => {
    const ids = await opened();
    const a = set(ids, { field: 'code', value: 'N7a', hlc: '1781602867120.9' });
    const b = set(ids, { field: 'code', value: 'N7b', hlc: '1781602867120.2' });
    await words(a, b);
    const settled = set(ids, { field: 'code', value: 'N7', base: [a.opId, b.opId], hlc: '1781602867120.0' });
    await words(settled);
    expect((await nestOf(ids)).code).toBe('N7');
    expect(await flagOf(settled)).toBe('');
  });

  it('may be edited from the operation that opened its entity', async () => {
    const ids = await opened();
    expect(await words(set(ids, { field: 'taxon', value: 'Polistes metricus', base: ids.opening.opId }))).toEqual([
      'applied',
    ]);
    expect((await nestOf(ids)).taxon).toBe('Polistes metricus');
  });

  it('is never edited from another field, entity or kind (B47)', async () => {
    const [ids, other] = [await opened(), await opened()];
    const name = set(ids, { field: 'name', value: 'x' });
    const note = wireOp({ kind: 'note.set', nest: ids.nest, body: { entity: 'nest', text: 'x', base: null } });
    await words(name, note);
    expect(await words(set(ids, { field: 'code', value: 'y', base: name.opId }))).toEqual(['quarantined base']);
    expect(await words(set(other, { field: 'name', value: 'y', base: name.opId }))).toEqual(['quarantined base']);
    expect(await words(set(ids, { field: 'name', value: 'y', base: note.opId }))).toEqual(['quarantined base']);
    expect(await words(set(ids, { field: 'name', value: 'y', base: other.opening.opId }))).toEqual([
      'quarantined base',
    ]);
    expect(await words(set(ids, { field: 'name', value: 'y', base: v7() }))).toEqual(['parked deps']);
  });

  it('may be a place, set and cleared', async () => {
    const ids = await opened();
    const placed = set(ids, { field: 'place', value: { lat: 43.598, lon: -77.605, accuracyM: 4 } });
    await words(placed);
    expect(await nestOf(ids)).toMatchObject({ lat: 43.598, lon: -77.605, accuracy_m: 4 });
    await words(set(ids, { field: 'place', value: null, base: placed.opId }));
    expect(await nestOf(ids)).toMatchObject({ lat: null, lon: null, accuracy_m: null });
  });

  it('of a visit or reading changes that row; an unknown one is kept and changes nothing', async () => {
    const ids = await opened();
    const startedAt = '2026-06-16T05:50:00-04:00';
    await words(
      set(ids, { entity: 'visit', field: 'purpose', value: 'lab' }),
      set(ids, { entity: 'visit', field: 'startedAt', value: startedAt }),
      set(ids, { entity: ids.reading, field: 'aid', value: 'red headlamp' }),
      set(ids, { entity: 'nest', field: 'height', value: 2.8 }),
    );
    const where = (id: string) => ({ where: { team_id: toBinary(team.teamId), id: toBinary(id) } });
    expect(await database().models.Visit.findOne(where(ids.visit))).toMatchObject({
      purpose: 'lab',
      started_at: new Date(startedAt),
      started_at_text: startedAt,
    });
    expect(await database().models.Reading.findOne(where(ids.reading))).toMatchObject({
      aid: 'red headlamp',
      light: null,
    });
  });
});

describe('a note', () => {
  it('keeps every version and flags two made from the same one', async () => {
    const ids = await opened();
    const note = (text: string, base: Json) =>
      wireOp({ kind: 'note.set', nest: ids.nest, body: { entity: 'nest', text, base } });
    const [first, second] = [note('wet', null), note('dry', null)];
    expect(await words(first, second)).toEqual(['applied', 'applied']);
    expect([await flagOf(first), await flagOf(second)]).toEqual(['', 'conflict']);
  });
});
