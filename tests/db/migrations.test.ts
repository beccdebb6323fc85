import { QueryTypes, type Sequelize } from 'sequelize';
import { expect, test } from 'vitest';
import { createMigrator } from '@/lib/cli/run-migrations';
import { asMigrator, createTestDatabase } from '@/tests/support/database';

/** Every table with its columns, types, keys and triggers, as the server describes it. */
async function schemaOf(sequelize: Sequelize): Promise<string[]> {
  const tables = await sequelize.query<{ name: string }>(
    `SELECT table_name AS name FROM information_schema.tables
      WHERE table_schema = DATABASE() AND table_name <> 'schema_migrations' ORDER BY table_name`,
    { type: QueryTypes.SELECT },
  );
  const descriptions: string[] = [];
  for (const { name } of tables) {
    const [row] = await sequelize.query<Record<string, string>>(`SHOW CREATE TABLE \`${name}\``, {
      type: QueryTypes.SELECT,
    });
    descriptions.push(Object.values(row ?? {}).join('\n'));
  }
  return descriptions;
}

test('every migration can be taken back, and brings the same schema when applied again', async () => {
  const own = await createTestDatabase();
  await asMigrator(own.name, async (sequelize) => {
    const migrator = createMigrator(sequelize);
    const before = await schemaOf(sequelize);
    expect(before.length).toBeGreaterThan(0);
    await migrator.down({ to: 0 });
    expect(await schemaOf(sequelize)).toEqual([]);
    await migrator.up();
    expect(await schemaOf(sequelize)).toEqual(before);
    expect(await migrator.pending()).toEqual([]);
  });
  await own.drop();
});

test('migrations are named by date in the order they run', async () => {
  const own = await createTestDatabase();
  const names = await asMigrator(own.name, async (sequelize) =>
    (await createMigrator(sequelize).executed()).map(({ name }) => name),
  );
  expect(names).toEqual([...names].sort());
  for (const name of names) expect(name).toMatch(/^\d{4}-\d\d-\d\d-\d\d-[a-z0-9-]+\.ts$/);
  await own.drop();
});
