import { QueryTypes, type Transaction } from 'sequelize';
import { v7 } from 'uuid';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import { lockCounter } from '@/lib/server/commands/push/lock-counter';
import { memberContext } from '@/lib/server/auth/member-context';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { errnoOf, isRetryable, isUnavailable } from '@/lib/server/db/database-errors';
import { MAX_TRIES, inTransaction } from '@/lib/server/db/in-transaction';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { expectConsole } from '@/tests/support/console-guard';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { pushAs, wordsOf } from '@/tests/support/push/push-as';
import { wireOp } from '@/tests/support/wire/wire-op';

let team: TestTeam;
let ctx: TeamContext;

beforeAll(async () => {
  team = await makeTeam();
  ctx = await memberContext(team.teamId, team.members.technician.userId);
});

async function rename(id: string, transaction: Transaction): Promise<void> {
  const replacements = [toBinary(id)];
  await database().sequelize.query('UPDATE teams SET zone = zone, name = CONCAT(name, "!") WHERE id = ?', {
    replacements,
    transaction,
  });
}

/** A statement that the server answers with an error of this number. */
async function fail(errno: number, transaction: Transaction): Promise<never> {
  await database().sequelize.query(`SIGNAL SQLSTATE '45000' SET MYSQL_ERRNO = ${errno}, MESSAGE_TEXT = 'forced'`, {
    transaction,
  });
  throw new Error('the statement should have failed');
}

describe('a transaction', () => {
  it('is run again as a whole after a real deadlock (1213, F41)', async () => {
    const [a, b] = [(await makeTeam()).teamId, (await makeTeam()).teamId];
    const tries = { first: 0, second: 0 };
    let secondHasOne: () => void = () => undefined;
    const reached = new Promise<void>((resolve) => (secondHasOne = resolve));
    let firstHasOne: () => void = () => undefined;
    const begun = new Promise<void>((resolve) => (firstHasOne = resolve));
    const first = inTransaction(async (transaction) => {
      tries.first += 1;
      await rename(a, transaction);
      firstHasOne();
      await reached;
      await rename(b, transaction);
    });
    const second = inTransaction(async (transaction) => {
      tries.second += 1;
      await begun;
      await rename(b, transaction);
      secondHasOne();
      await rename(a, transaction);
    });
    await Promise.all([first, second]);
    expect(tries.first + tries.second).toBe(3);
    const names = await database().sequelize.query<{ name: string }>('SELECT name FROM teams WHERE id IN (?)', {
      type: QueryTypes.SELECT,
      replacements: [[toBinary(a), toBinary(b)]],
    });
    expect(names.map(({ name }) => name)).toEqual(['Tarrow Trust!!', 'Tarrow Trust!!']);
  });

  it.each([1213, 1205, 1020, 1047])('is run again after error %i, and what failed leaves nothing', async (errno) => {
    const code = `retried after ${errno}`;
    let tries = 0;
    await inTransaction(async (transaction) => {
      tries += 1;
      await lockCounter(ctx, transaction);
      await database().models.Taxon.create(
        { team_id: toBinary(team.teamId), id: toBinary(v7()), scientific_name: code, status: 'native' },
        { transaction },
      );
      if (tries < 3) await fail(errno, transaction);
    });
    expect(tries).toBe(3);
    expect(
      await database().models.Taxon.count({ where: { team_id: toBinary(team.teamId), scientific_name: code } }),
    ).toBe(1);
  });

  it('is run again after its connection was cut', async () => {
    expectConsole('warn', /Rolling back transaction .* connection closed/s);
    let tries = 0;
    await inTransaction(async (transaction) => {
      tries += 1;
      await lockCounter(ctx, transaction);
      if (tries > 1) return;
      const [row] = await database().sequelize.query<{ id: number }>('SELECT CONNECTION_ID() AS id', {
        type: QueryTypes.SELECT,
        transaction,
      });
      await database().sequelize.query(`KILL CONNECTION ${row?.id}`);
      await lockCounter(ctx, transaction);
    });
    expect(tries).toBe(2);
  });

  it('gives up after five tries with an error that means: come back later', async () => {
    let tries = 0;
    const error: unknown = await inTransaction(async (transaction) => {
      tries += 1;
      await fail(1213, transaction);
    }).catch((caught: unknown) => caught);
    expect(tries).toBe(MAX_TRIES);
    expect(errnoOf(error)).toBe(1213);
    expect([isRetryable(error), isUnavailable(error)]).toEqual([true, true]);
  });

  it.each([1062, 1452, 1406])('is not run again after error %i, which would only come back', async (errno) => {
    let tries = 0;
    const error: unknown = await inTransaction(async (transaction) => {
      tries += 1;
      await fail(errno, transaction);
    }).catch((caught: unknown) => caught);
    expect(tries).toBe(1);
    expect(isUnavailable(error)).toBe(false);
  });
});

describe('a push whose transaction fails half-way', () => {
  it('has its whole effect once after the retry, with the same places (I2)', async () => {
    const { AuditEntry } = database().models;
    const create = AuditEntry.create.bind(AuditEntry);
    let failures = 2;
    vi.spyOn(AuditEntry, 'create').mockImplementation(async (...args) => {
      const transaction = args[1]?.transaction;
      if (failures-- > 0 && transaction) await fail(1213, transaction);
      return create(...args);
    });
    const op = wireOp({ kind: 'nest.open', nest: v7(), body: { code: 'N1' } });
    const [result] = await pushAs(team, team.members.technician, [op]);
    expect(result).toMatchObject({ r: 'applied', seq: 1 });
    expect(wordsOf(await pushAs(team, team.members.technician, [op]))).toEqual(['duplicate']);
    expect(await database().models.Nest.count({ where: { team_id: toBinary(team.teamId) } })).toBe(1);
  });

  it('leaves nothing at all when it gives up', async () => {
    const count = () => database().models.Op.count({ where: { team_id: toBinary(team.teamId) } });
    const before = await count();
    vi.spyOn(database().models.AuditEntry, 'create').mockRejectedValue(new Error('no'));
    const op = wireOp({ kind: 'nest.open', nest: v7(), body: { code: 'N2' } });
    await expect(pushAs(team, team.members.technician, [op])).rejects.toThrow('no');
    expect(await count()).toBe(before);
  });
});
