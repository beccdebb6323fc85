import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { pushAs, wordsOf } from '@/tests/support/push/push-as';
import { freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

describe('a push', () => {
  it('applies a whole first visit and gives it gapless places in the log', async () => {
    const ids = freshIds();
    const ops = [...openingOps(ids, 'N31'), markOp(ids, { q: 0, r: 0, state: 'egg' })];
    const results = await pushAs(team, team.members.technician, ops);
    expect(wordsOf(results)).toEqual(['applied', 'applied', 'applied', 'applied']);
    const [first = 0] = results.map(({ seq }) => seq);
    expect(results.map(({ seq }) => seq)).toEqual([first, first + 1, first + 2, first + 3]);
    const nest = await database().models.Nest.findOne({ where: { team_id: toBinary(team.teamId), id: toBinary(ids.nest) } });
    expect(nest?.code).toBe('N31');
    expect(wordsOf(await pushAs(team, team.members.technician, ops))).toEqual(Array(4).fill('duplicate'));
    expect(v7()).not.toBe('');
  });
});
