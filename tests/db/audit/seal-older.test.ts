import { beforeAll, expect, it } from 'vitest';
import { checkTeams } from '@/lib/server/audit/check-teams';
import { createMigrator } from '@/lib/cli/run-migrations';
import { makeDecidedTeam } from '@/tests/support/audit/decided-team';
import { asMigrator } from '@/tests/support/database';

const MIGRATION = '2026-12-01-05-audit-chain-and-samples.ts';

beforeAll(async () => {
  await makeDecidedTeam();
});

it('final readings decided before entries spoke of rows are sealed by the migration as they are', async () => {
  await asMigrator(process.env.DB_NAME ?? '', async (sequelize) => {
    await createMigrator(sequelize).down({ to: MIGRATION });
    // The chain as it was before: no entry, so the final readings hang on nothing.
    await sequelize.query('DROP TRIGGER audit_entries_no_delete');
    await sequelize.query('DELETE FROM audit_entries');
    await sequelize.query('UPDATE team_counters SET audit_seq = 0, audit_hash = UNHEX(REPEAT("0", 64))');
  });
  const [before] = await checkTeams([]);
  expect(before?.faults.length).toBeGreaterThan(3);
  await asMigrator(process.env.DB_NAME ?? '', (sequelize) => createMigrator(sequelize).up());
  const [after] = await checkTeams([]);
  expect(after).toMatchObject({ entries: 4, finals: 4, settlements: 16, faults: [] });
});

it('running it again seals nothing twice', async () => {
  await asMigrator(process.env.DB_NAME ?? '', async (sequelize) => {
    await createMigrator(sequelize).down({ to: MIGRATION });
    await createMigrator(sequelize).up();
  });
  expect((await checkTeams([]))[0]).toMatchObject({ entries: 4, faults: [] });
});
