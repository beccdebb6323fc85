import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { dataDir, port } from '@/lib/server/env';
import { setup as databaseUp } from './database-up';
import { makeDemoDatabases } from './demo-database';
import { startTestServer } from './server';

/**
 * Playwright set-up: a fresh database with the demo season, and the built application serving it to every test that
 * does not start a server of its own. Returns the tear-down. (Playwright asks for a default export.)
 */
export default async function setUp(): Promise<() => Promise<void>> {
  await databaseUp();
  rmSync(join(dataDir(), 'servers'), { recursive: true, force: true });
  await makeDemoDatabases();
  const server = await startTestServer({ database: 'undereave', port: port() });
  return server.close;
}
