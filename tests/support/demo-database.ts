import { database } from '@/lib/server/db/database';
import { loadDemoSeason } from '@/lib/server/demo/load-demo-season';
import { copyDatabase } from './copy-database';
import { type TestDatabase, dropDatabase, freshDatabaseName, makeDatabase } from './database';

/** The database the shared server of the browser tests works on. */
const SHARED = 'undereave';
/** The demo season as loaded, touched by nobody. */
const PRISTINE = 'undereave_demo';

/** Makes the shared database anew with the demo season in it, and a pristine copy for `createDemoDatabase`. */
export async function makeDemoDatabases(): Promise<void> {
  await makeDatabase(SHARED);
  await loadDemoSeason();
  await database().sequelize.close();
  await copyDatabase(SHARED, PRISTINE);
}

/** A database with the demo season for one test that kills or fills its own server. */
export async function createDemoDatabase(): Promise<TestDatabase> {
  const name = freshDatabaseName();
  await copyDatabase(PRISTINE, name);
  return { name, drop: () => dropDatabase(name) };
}
