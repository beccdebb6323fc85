import { beforeAll, describe, expect, it } from 'vitest';
import { auditSnapshot } from '@/lib/server/audit/audit-snapshot';
import { checkTeams } from '@/lib/server/audit/check-teams';
import { verifyAudit } from '@/lib/server/audit/verify-audit';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { defineModels } from '@/models';
import { makeDecidedTeam } from '@/tests/support/audit/decided-team';
import { asMigrator } from '@/tests/support/database';

let team: string;

beforeAll(async () => {
  team = (await makeDecidedTeam()).teamId;
  await asMigrator(process.env.DB_NAME ?? '', async (sequelize) => {
    for (const table of ['settlements', 'audit_entries', 'marks', 'retractions', 'reading_locks']) {
      for (const verb of ['update', 'delete']) await sequelize.query(`DROP TRIGGER ${table}_no_${verb}`);
    }
  });
});

/** What the check says after a change of the rows by somebody who got past the triggers; the change is taken back. */
async function faultsAfter(sql: string): Promise<string[]> {
  return asMigrator(process.env.DB_NAME ?? '', async (sequelize) => {
    const transaction = await sequelize.transaction();
    try {
      await sequelize.query('SET FOREIGN_KEY_CHECKS = 0', { transaction });
      await sequelize.query(sql, { transaction });
      const db = { sequelize, models: defineModels(sequelize) };
      const snapshot = await auditSnapshot({ team: toBinary(team), user: Buffer.alloc(16), db, transaction });
      return verifyAudit(snapshot).map(({ found }) => found);
    } finally {
      await transaction.rollback();
    }
  });
}

const ONE = (table: string) => `(SELECT MIN(x.id) FROM (SELECT * FROM ${table}) x)`;
const FINAL = "(SELECT MIN(x.id) FROM (SELECT * FROM readings WHERE kind = 'final') x)";

describe('a change of the stored rows', () => {
  it.each([
    ["a decision's state", `UPDATE settlements SET state = 'capped' WHERE id = ${ONE('settlements')}`],
    ["a decision's reason", `UPDATE settlements SET reason = CONCAT(reason, ' ') WHERE id = ${ONE('settlements')}`],
    ["a decision's time", `UPDATE settlements SET created_at = '2026-01-01' WHERE id = ${ONE('settlements')}`],
    [
      "a decision's author",
      `UPDATE settlements SET actor_id = UNHEX(REPEAT('0', 32)) WHERE id = ${ONE('settlements')}`,
    ],
    ['a decision taken away', `DELETE FROM settlements WHERE id = ${ONE('settlements')}`],
    [
      'a decision put in',
      `INSERT INTO settlements SELECT team_id, UNHEX(REPEAT('ab', 16)), reading_id, version, 99, q, r, 'dead', reason,
         mark_op_id, actor_id, created_at, pick FROM settlements LIMIT 1`,
    ],
    ['whose state was taken', `UPDATE settlements SET pick = 'field' WHERE id = ${ONE('settlements')}`],
    ['the seal of a lock', "UPDATE reading_locks SET cells_hash = UNHEX(REPEAT('0', 64)) LIMIT 1"],
    ['the names on a lock', "UPDATE reading_locks SET names = REPLACE(names, 'e', 'a') LIMIT 1"],
    ['a sealed lock taken away', 'DELETE FROM reading_locks LIMIT 1'],
    ['a lock taken away', `UPDATE readings SET locked_version = NULL WHERE id = ${FINAL}`],
    ['another name on a lock', `UPDATE readings SET opened_by = UNHEX(REPEAT('0', 32)) WHERE id = ${FINAL}`],
    ['a final reading taken away', `DELETE FROM readings WHERE id = ${FINAL}`],
    ['a mark behind it', "UPDATE marks SET state = 'dead' WHERE state = 'egg' LIMIT 1"],
    ['a mark taken away', 'DELETE FROM marks LIMIT 1'],
    ['an entry', "UPDATE audit_entries SET detail = REPLACE(detail, 'egg', 'dead') WHERE seq = 2"],
    ['the last entry taken away', 'DELETE FROM audit_entries ORDER BY seq DESC LIMIT 1'],
    ['the counter', 'UPDATE team_counters SET audit_seq = audit_seq - 1'],
  ])('is found: %s', async (_, sql) => {
    expect(await faultsAfter(sql)).not.toEqual([]);
  });

  it('is not imagined: rows that were left alone pass, and so does a mark made after the lock', async () => {
    expect(await faultsAfter('SELECT 1')).toEqual([]);
    const late = `INSERT INTO marks SELECT team_id, UNHEX(REPEAT('ab', 16)), reading_id, 100000, q, r, 'dead', nectar, unsure,
       reused, scrap, instar, note, NULL, hlc, at_text FROM marks LIMIT 1`;
    expect(await faultsAfter(late)).toEqual([]);
  });
});

it('every team of the machine is checked, with its sizes and its head', async () => {
  const [audit, ...more] = await checkTeams(['ab'.repeat(32)]);
  expect(more).toEqual([]);
  expect(audit).toMatchObject({ entries: 13, finals: 4, settlements: 16, known: [], faults: [] });
  expect((await checkTeams([audit?.head ?? '']))[0]?.known).toEqual([audit?.head]);
});
