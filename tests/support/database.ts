import { randomBytes } from 'node:crypto';
import { QueryTypes, type Sequelize } from 'sequelize';
import { processMark } from '@/lib/cli/pid-lock.mjs';
import { migrateUp } from '@/lib/cli/run-migrations';
import { connect } from '@/lib/server/db/connect';

/** Where a migrator connects to create and drop other databases. */
const ANCHOR = 'undereave';
const PREFIX = 'undereave_t_';

/** A database that belongs to one test file or one server under test. */
export interface TestDatabase {
  name: string;
  drop(): Promise<void>;
}

/** Runs work with a connection that may change tables. */
export async function asMigrator<T>(database: string, work: (sequelize: Sequelize) => Promise<T>): Promise<T> {
  const sequelize = connect({ role: 'migrate', database, poolSize: 1 });
  try {
    return await work(sequelize);
  } finally {
    await sequelize.close();
  }
}

/** Deletes a database, if there is one of this name. */
export async function dropDatabase(name: string): Promise<void> {
  await asMigrator(ANCHOR, (sequelize) => sequelize.query(`DROP DATABASE IF EXISTS \`${name}\``));
}

/** Makes (anew) a database without tables. */
export async function makeBareDatabase(name: string): Promise<void> {
  await asMigrator(ANCHOR, async (sequelize) => {
    await sequelize.query(`DROP DATABASE IF EXISTS \`${name}\``);
    await sequelize.query(`CREATE DATABASE \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
  });
}

/** Makes (anew) a database with the newest schema and no rows. */
export async function makeDatabase(name: string): Promise<TestDatabase> {
  await makeBareDatabase(name);
  await asMigrator(name, migrateUp);
  return { name, drop: () => dropDatabase(name) };
}

/** A database name nobody else uses; it tells which process to blame when it is left behind. */
export function freshDatabaseName(): string {
  return `${PREFIX}${process.pid}_${randomBytes(4).toString('hex')}`;
}

/** Makes a migrated, empty database with a name nobody else uses. */
export function createTestDatabase(): Promise<TestDatabase> {
  return makeDatabase(freshDatabaseName());
}

function ownerIsAlive(name: string): boolean {
  return processMark(Number(name.slice(PREFIX.length).split('_')[0])) !== null;
}

/** Drops what tests that were cut short have left behind: databases of processes that are gone. */
export async function dropAbandonedDatabases(): Promise<void> {
  const rows = await asMigrator(ANCHOR, (sequelize) =>
    sequelize.query<{ name: string }>('SELECT schema_name AS name FROM information_schema.schemata', {
      type: QueryTypes.SELECT,
    }),
  );
  const left = rows.filter(({ name }) => name.startsWith(PREFIX) && !ownerIsAlive(name));
  for (const { name } of left) await dropDatabase(name);
}
