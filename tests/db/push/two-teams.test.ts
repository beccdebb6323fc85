import { beforeAll, describe, expect, it } from 'vitest';
import type { Op } from '@/lib/protocol/op';
import { memberContext } from '@/lib/server/auth/member-context';
import { haveOps } from '@/lib/server/commands/sync/have-ops';
import { pullPage } from '@/lib/server/commands/sync/pull-page';
import { database } from '@/lib/server/db/database';
import { errnoOf } from '@/lib/server/db/database-errors';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { RECEIVED_MS, pushAs, wordsOf } from '@/tests/support/push/push-as';
import { freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';

let tarrow: TestTeam;
let ossle: TestTeam;
const ids = freshIds();
const ops = [...openingOps(ids, 'N1'), markOp(ids, { q: 0, r: 0, state: 'egg' })];

beforeAll(async () => {
  tarrow = await makeTeam({ name: 'Tarrow' });
  ossle = await makeTeam({ name: 'Ossle' });
});

const words = async (team: TestTeam, list: readonly Op[]) => wordsOf(await pushAs(team, team.members.technician, list));

describe('two teams with the same ids', () => {
  it('do not see what the other has: an unknown id and another team’s answer alike (B20)', async () => {
    await words(tarrow, ops);
    const mark = markOp(ids, { q: 1, r: 0, state: 'egg' });
    const unknown = markOp(freshIds(), { q: 1, r: 0, state: 'egg' });
    expect(await words(ossle, [mark, unknown])).toEqual(['parked deps', 'parked deps']);
  });

  it('each apply the same operations as their own (B16)', async () => {
    expect(await words(ossle, ops)).toEqual(Array(4).fill('applied'));
    const { Op, Nest, Mark } = database().models;
    for (const team of [tarrow, ossle]) {
      const where = { team_id: toBinary(team.teamId) };
      expect(await Nest.count({ where })).toBe(1);
      expect(await Mark.count({ where })).toBe(team === ossle ? 2 : 1);
      const rows = await Op.findAll({ where, order: ['seq'] });
      expect(rows.map(({ seq }) => seq)).toEqual(rows.map((_, index) => index + 1));
    }
  });

  it('pull and ask only for their own', async () => {
    const [mine, theirs] = await Promise.all(
      [tarrow, ossle].map((team) => memberContext(team.teamId, team.members.technician.userId)),
    );
    if (!mine || !theirs) throw new Error('two contexts');
    const page = await pullPage(mine, {}, RECEIVED_MS);
    expect(new Set(page.rows.map(({ actor }) => actor))).toEqual(new Set([tarrow.members.technician.userId]));
    const extra = markOp(ids, { q: 2, r: 0, state: 'egg' });
    await words(ossle, [extra]);
    expect((await haveOps(mine, [extra.opId], RECEIVED_MS)).have).toEqual([]);
    expect((await haveOps(theirs, [extra.opId], RECEIVED_MS)).have).toEqual([extra.opId]);
  });

  it('cannot be tied together in the database: a foreign key across teams is refused (1452)', async () => {
    const stray = freshIds();
    await words(tarrow, openingOps(stray, 'N2'));
    const insert = database().models.Visit.create({
      team_id: toBinary(ossle.teamId),
      id: toBinary(stray.visit),
      nest_id: toBinary(stray.nest),
      purpose: 'check',
      started_at: new Date(RECEIVED_MS),
      started_at_text: '2026-06-16T06:00:00-04:00',
      opened_by: toBinary(ossle.members.technician.userId),
      archived_at: null,
    });
    expect(errnoOf(await insert.catch((error: unknown) => error))).toBe(1452);
  });
});
