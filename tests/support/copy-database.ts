import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { databasePort, readDataFile } from '@/lib/server/env';
import { makeBareDatabase } from './database';

function connection(): string[] {
  return ['--no-defaults', '--host=127.0.0.1', `--port=${databasePort()}`, '--user=undereave_migrate'];
}

/**
 * Makes `to` (anew) an exact copy of the database `from`: tables, keys, triggers and rows.
 *
 * @throws when either program of the dump fails.
 */
export async function copyDatabase(from: string, to: string): Promise<void> {
  await makeBareDatabase(to);
  const env = { ...process.env, MYSQL_PWD: readDataFile('db-migrate-password') ?? '' };
  const dump = spawn('mariadb-dump', [...connection(), '--single-transaction', '--triggers', '--hex-blob', from], {
    env,
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const load = spawn('mariadb', [...connection(), to], { env, stdio: ['pipe', 'inherit', 'inherit'] });
  dump.stdout.pipe(load.stdin);
  const [[dumped], [loaded]] = await Promise.all([once(dump, 'close'), once(load, 'close')]);
  if (dumped !== 0 || loaded !== 0) throw new Error(`Copying ${from} to ${to} failed (${dumped}, ${loaded}).`);
}
