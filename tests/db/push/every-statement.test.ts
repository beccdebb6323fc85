import { v7 } from 'uuid';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import type { Op } from '@/lib/protocol/op';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { expectConsole } from '@/tests/support/console-guard';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { pushAs, wordsOf } from '@/tests/support/push/push-as';
import { freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';
import { wireOp } from '@/tests/support/wire/wire-op';

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

/** An error as the connector would report it. */
function databaseError(errno: number): Error {
  return Object.assign(new Error('forced'), { parent: { errno } });
}

/** A batch that touches every table a push can: it opens, marks, retracts, submits, sets, archives, parks and sets aside. */
function batch(): Op[] {
  const ids = freshIds();
  const opening = openingOps(ids, 'N1');
  const mark = markOp(ids, { q: 0, r: 0, state: 'egg' });
  return [
    ...opening,
    mark,
    wireOp({ kind: 'cell.retract', ...ids, body: { target: mark.opId } }),
    wireOp({ kind: 'reading.submit', ...ids, body: {} }),
    wireOp({ kind: 'field.set', nest: ids.nest, body: { entity: 'nest', field: 'name', value: 'x', base: null } }),
    wireOp({ kind: 'entity.archive', ...ids, reading: null, body: { entity: 'visit' } }),
    wireOp({ kind: 'reading.submit', nest: v7(), reading: v7(), body: {} }),
    { ...markOp(ids, { q: 1, r: 0, state: 'egg' }), bodyHash: 'wrong' },
  ];
}

const EXPECTED = [...Array<string>(8).fill('applied'), 'parked deps', 'quarantined hash'];

/** Rows of every table that a push writes to. */
async function rowCounts(): Promise<number[]> {
  const { Op, Nest, Visit, Reading, Mark, Retraction, QuarantinedOp, AuditEntry } = database().models;
  const where = { team_id: toBinary(team.teamId) };
  const counts = [Op, Nest, Visit, Reading, Mark, Retraction, QuarantinedOp, AuditEntry].map((model) =>
    (model as typeof Op).count({ where }),
  );
  return Promise.all(counts);
}

/** Lets the n-th statement from now on meet a fault; returns how many there were. */
function onStatement(n: number, fault: (run: () => Promise<unknown>) => Promise<unknown>): { count: number } {
  const { sequelize } = database();
  const query = sequelize.query.bind(sequelize);
  const seen = { count: 0 };
  vi.spyOn(sequelize, 'query').mockImplementation((async (...args: Parameters<typeof query>) => {
    seen.count += 1;
    return seen.count === n ? fault(() => query(...args)) : query(...args);
  }) as typeof query);
  return seen;
}

/** The number of statements of one undisturbed push. */
async function statementCount(): Promise<number> {
  const seen = onStatement(0, (run) => run());
  expect(wordsOf(await pushAs(team, team.members.technician, batch()))).toEqual(EXPECTED);
  vi.restoreAllMocks();
  return seen.count;
}

describe('each statement of a push in turn (F48)', () => {
  it('failing for good leaves everything or nothing', async () => {
    expectConsole('warn', /transaction .* failed/s);
    const total = await statementCount();
    expect(total).toBeGreaterThan(20);
    for (let n = 1; n <= total; n++) {
      const [before, ops] = [await rowCounts(), batch()];
      onStatement(n, () => Promise.reject(databaseError(1406)));
      const failed = await pushAs(team, team.members.technician, ops).then(
        () => false,
        () => true,
      );
      vi.restoreAllMocks();
      expect(failed, `statement ${n}`).toBe(true);
      expect(await rowCounts(), `statement ${n}`).toEqual(before);
    }
  });

  it('failing once for a deadlock is made good by running the whole again', async () => {
    expectConsole('warn', /transaction .* failed/s);
    const total = await statementCount();
    // The first two statements read the member and the team, before the transaction.
    for (let n = 3; n <= total; n++) {
      const before = await rowCounts();
      onStatement(n, () => Promise.reject(databaseError(1213)));
      const words = wordsOf(await pushAs(team, team.members.technician, batch()));
      vi.restoreAllMocks();
      expect(words, `statement ${n}`).toEqual(EXPECTED);
      const grown = (await rowCounts()).map((count, index) => count - (before[index] ?? 0));
      expect(grown, `statement ${n}`).toEqual([8, 1, 1, 1, 1, 1, 2, 1]);
    }
  });

  it('with the answer to COMMIT lost is found to be done: nothing is doubled (F40)', async () => {
    expectConsole('warn', /transaction .* failed/s);
    const total = await statementCount();
    const [before, ops] = [await rowCounts(), batch()];
    onStatement(total, async (run) => {
      await run();
      throw Object.assign(new Error('forced'), { parent: { code: 'ECONNRESET' } });
    });
    const words = wordsOf(await pushAs(team, team.members.technician, ops));
    vi.restoreAllMocks();
    expect(words).toEqual([...Array<string>(8).fill('duplicate'), 'parked deps', 'quarantined hash']);
    const grown = (await rowCounts()).map((count, index) => count - (before[index] ?? 0));
    expect(grown.slice(0, 7)).toEqual([8, 1, 1, 1, 1, 1, 2]);
    const rows = await database().models.Op.findAll({ where: { team_id: toBinary(team.teamId) }, order: ['seq'] });
    expect(rows.map(({ seq }) => seq)).toEqual(rows.map((_, index) => index + 1));
  });
});
