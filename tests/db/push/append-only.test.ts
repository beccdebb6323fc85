import { beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/server/db/database';
import { errnoOf } from '@/lib/server/db/database-errors';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { makeReading } from '@/tests/support/factories/make-reading';
import { pushAs } from '@/tests/support/push/push-as';
import { freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';
import { wireOp } from '@/tests/support/wire/wire-op';
import { newId } from '@/lib/server/db/new-id';
import { toBinary } from '@/lib/server/db/uuid-binary';

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
  const ids = freshIds();
  const mark = markOp(ids, { q: 0, r: 0, state: 'egg' });
  await pushAs(team, team.members.technician, [
    ...openingOps(ids, 'N1'),
    mark,
    wireOp({ kind: 'cell.retract', ...ids, body: { target: mark.opId } }),
  ]);
  const reading = await makeReading(team, { nest: ids.nest, visit: ids.visit });
  await database().models.Settlement.create({
    team_id: toBinary(team.teamId),
    id: toBinary(newId()),
    reading_id: toBinary(reading),
    version: 1,
    position: 1,
    q: 0,
    r: 0,
    state: 'egg',
    reason: 'seen on the photo',
    mark_op_id: null,
    actor_id: toBinary(team.members.reviewer.userId),
    created_at: new Date('2026-06-17T00:00:00Z'),
  });
});

describe.each(['ops', 'marks', 'retractions', 'settlements', 'audit_entries'])('%s', (table) => {
  it('holds rows that cannot be changed or deleted (I15)', async () => {
    const { sequelize } = database();
    const [rows] = await sequelize.query(`SELECT COUNT(*) AS n FROM ${table}`);
    expect(rows).not.toEqual([{ n: 0 }]);
    for (const statement of [`UPDATE ${table} SET team_id = team_id`, `DELETE FROM ${table}`]) {
      const error: unknown = await sequelize.query(statement).catch((caught: unknown) => caught);
      expect(errnoOf(error)).toBe(1644);
      expect(String(error)).toContain(`${table} is append-only`);
    }
  });
});
