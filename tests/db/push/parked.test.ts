import { v7 } from 'uuid';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Op } from '@/lib/protocol/op';
import { database } from '@/lib/server/db/database';
import { newId } from '@/lib/server/db/new-id';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { pushAs, wordsOf } from '@/tests/support/push/push-as';
import { freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';
import { wireOp } from '@/tests/support/wire/wire-op';

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

beforeEach(async () => {
  await database().models.QuarantinedOp.destroy({ where: { team_id: toBinary(team.teamId) } });
});

const push = async (ops: readonly Op[], by = team.members.technician) => wordsOf(await pushAs(team, by, ops));
const kept = () =>
  database().models.QuarantinedOp.findAll({ where: { team_id: toBinary(team.teamId) }, order: ['received_at', 'id'] });
const logged = ({ opId }: Op) =>
  database().models.Op.findOne({ where: { team_id: toBinary(team.teamId), op_id: toBinary(opId) } });

describe('a parked operation', () => {
  it('is applied as soon as what it waits for arrives, in the name of who sent it (B21, F66)', async () => {
    const ids = freshIds();
    const [nest, visit, reading] = openingOps(ids, 'N1') as [Op, Op, Op];
    const mark = markOp(ids, { q: 0, r: 0, state: 'egg' });
    const retraction = wireOp({ kind: 'cell.retract', ...ids, body: { target: mark.opId } });
    expect(await push([retraction])).toEqual(['parked deps']);
    expect(await push([mark])).toEqual(['parked deps']);
    expect(await push([reading])).toEqual(['parked deps']);
    expect(await push([nest], team.members.technician2)).toEqual(['applied']);
    expect((await kept()).map(({ state }) => state)).toEqual(['parked', 'parked', 'parked']);
    expect(await push([visit], team.members.technician2)).toEqual(['applied']);
    expect(await kept()).toEqual([]);
    const rows = [await logged(visit), await logged(reading), await logged(mark), await logged(retraction)];
    const [first = 0] = rows.map((row) => row?.seq);
    expect(rows.map((row) => row?.seq)).toEqual([first, first + 1, first + 2, first + 3]);
    expect(rows.slice(1).map((row) => row && fromBinary(row.actor_id))).toEqual(
      Array(3).fill(team.members.technician.userId),
    );
    expect(await push([retraction, mark, reading])).toEqual(['duplicate', 'duplicate', 'duplicate']);
  });

  it('that waits for two things is looked at again, and notes what it still waits for', async () => {
    const ids = freshIds();
    await push(openingOps(ids, 'N2'));
    const [first, second] = [markOp(ids, { q: 0, r: 0, state: 'egg' }), markOp(ids, { q: 0, r: -1, state: 'egg' })];
    const waiting = wireOp({ kind: 'reading.submit', ...ids, deps: [first.opId, second.opId], body: {} });
    await push([waiting]);
    await push([first]);
    expect((await kept()).map(({ missing }) => JSON.parse(missing) as string[])).toEqual([[second.opId]]);
    await push([second]);
    expect(await kept()).toEqual([]);
    expect(await logged(waiting)).not.toBeNull();
  });

  it('sent again together with what it waits for stands in the log once and is kept aside no longer', async () => {
    const ids = freshIds();
    const mark = markOp(ids, { q: 0, r: 0, state: 'egg' });
    await push([mark]);
    expect(await push([...openingOps(ids, 'N3'), mark])).toEqual(Array(4).fill('applied'));
    expect(await kept()).toEqual([]);
  });

  it('that turns out to be impossible is set aside with its reason', async () => {
    const ids = freshIds();
    const mark = markOp(ids, { q: 0, r: 0, state: 'egg' });
    const wrong = wireOp({ kind: 'cell.retract', ...ids, deps: [mark.opId], body: { target: mark.opId } });
    const foreign = markOp(ids, { q: 0, r: -1, state: 'egg' });
    await push([wrong]);
    await push([foreign], team.members.technician2);
    const first = wireOp({ kind: 'cell.retract', ...ids, body: { target: mark.opId } });
    expect(await push([...openingOps(ids, 'N4'), mark, first])).toEqual(Array(5).fill('applied'));
    const rows = await kept();
    expect(rows.map(({ op_id, state, code }) => [op_id && fromBinary(op_id), state, code])).toEqual([
      [wrong.opId, 'quarantined', 'retracted'],
      [foreign.opId, 'refused', 'right'],
    ]);
  });

  it('of a kind this server has learned since is applied with the next push', async () => {
    const ids = freshIds();
    const op = openingOps(ids, 'N5')[0] as Op;
    await database().models.QuarantinedOp.create({
      team_id: toBinary(team.teamId),
      id: toBinary(newId()),
      digest: Buffer.alloc(32, 7),
      op_id: toBinary(op.opId),
      state: 'parked',
      code: 'newer',
      raw: JSON.stringify(op),
      missing: JSON.stringify(['nest.open@1']),
      actor_id: toBinary(team.members.technician.userId),
      received_at: new Date('2026-06-16T09:00:00Z'),
    });
    await push([wireOp({ kind: 'nest.open', nest: v7(), body: { code: 'N6' } })]);
    expect((await logged(op))?.received_at).toEqual(new Date('2026-06-16T09:00:00Z'));
    expect(await kept()).toEqual([]);
  });

  it('of a kind nobody knows yet stays parked', async () => {
    expect(await push([wireOp({ kind: 'nest.weigh', nest: v7(), body: {} })])).toEqual(['parked newer']);
    await push([wireOp({ kind: 'nest.open', nest: v7(), body: { code: 'N7' } })]);
    expect((await kept()).map(({ code, missing }) => [code, missing])).toEqual([['newer', '["nest.weigh@1"]']]);
  });

  it('revives a chain of any length', async () => {
    const ids = freshIds();
    const opening = openingOps(ids, 'N8');
    const chain: Op[] = [];
    for (let i = 0; i < 30; i++) {
      const deps = i === 0 ? [opening[2]?.opId ?? ''] : [chain[i - 1]?.opId ?? ''];
      chain.push({
        ...wireOp({ kind: 'step.mark', nest: ids.nest, deps, body: { step: `step ${i}`, phase: 'mark' } }),
      });
    }
    for (const op of [...chain].reverse()) await push([op]);
    expect(await kept()).toHaveLength(30);
    expect(await push(opening)).toEqual(Array(3).fill('applied'));
    expect(await kept()).toEqual([]);
  });
});
