import { execFile } from 'node:child_process';
import { mkdirSync, readFileSync, rmSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { promisify } from 'node:util';
import * as mariadb from 'mariadb';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { dataDir } from '@/lib/server/env';
import { freePort } from '@/tests/support/server';

const run = promisify(execFile);
const folder = join(dataDir(), `script-${process.pid}`);
let port: number;

/** Runs the script on a folder and port of this test's own; resolves with its exit code and words. */
async function script(...args: string[]): Promise<{ code: number; words: string }> {
  const env = { ...process.env, DB_FLUSH: '', DATA_DIR: folder, DB_PORT: String(port) };
  try {
    const { stdout, stderr } = await run('./docker-free-db.sh', args, { env });
    return { code: 0, words: stdout + stderr };
  } catch (error) {
    const { code, stdout, stderr } = error as { code: number; stdout: string; stderr: string };
    return { code, words: stdout + stderr };
  }
}

async function asApplication<T>(work: (connection: mariadb.Connection) => Promise<T>): Promise<T> {
  const password = readFileSync(join(folder, 'db-password'), 'utf8');
  const connection = await mariadb.createConnection({
    host: '127.0.0.1',
    port,
    user: 'undereave',
    password,
    database: 'undereave',
    bigIntAsNumber: true,
  });
  try {
    return await work(connection);
  } finally {
    await connection.end();
  }
}

beforeAll(async () => {
  port = await freePort();
  mkdirSync(folder, { recursive: true });
  expect(await script('start')).toMatchObject({ code: 0 });
}, 180_000);

afterAll(async () => {
  await script('reset');
  rmSync(folder, { recursive: true, force: true });
}, 60_000);

describe('docker-free-db.sh', () => {
  test('starting again, also twice at once, changes nothing', async () => {
    const pid = () => readFileSync(join(folder, 'db', 'pid'), 'utf8');
    const before = pid();
    const answers = await Promise.all([script('start'), script('start')]);
    expect(answers.map(({ code }) => code)).toEqual([0, 0]);
    expect(pid()).toBe(before);
    expect((await script('status')).words).toContain(`running on 127.0.0.1:${port}`);
  });

  test('the server is set so that a committed row survives, and nobody outside this machine reaches it', async () => {
    const [row] = await asApplication((connection) =>
      connection.query<Record<string, unknown>[]>(
        `SELECT @@log_bin AS binlog, @@sync_binlog AS sync, @@binlog_format AS format, @@bind_address AS address,
                @@innodb_flush_log_at_trx_commit AS flush, @@innodb_snapshot_isolation AS snapshot,
                @@character_set_server AS charset, @@time_zone AS zone, @@skip_name_resolve AS by_address`,
      ),
    );
    const survives = { binlog: 1, sync: 1, format: 'ROW', flush: 1, snapshot: 1 };
    expect(row).toEqual({ ...survives, address: '127.0.0.1', charset: 'utf8mb4', zone: '+00:00', by_address: 1 });
  });

  test('the server does not run as root', () => {
    const pid = readFileSync(join(folder, 'db', 'pid'), 'utf8').trim();
    expect(statSync(`/proc/${pid}`).uid).not.toBe(0);
  });

  test('the application may change rows and no tables, and its password is for its owner only', async () => {
    const refused = asApplication((connection) => connection.query('CREATE TABLE t (id INT PRIMARY KEY)'));
    await expect(refused).rejects.toMatchObject({ errno: 1142 });
    expect(statSync(join(folder, 'db-password')).mode & 0o077).toBe(0);
    expect(statSync(join(folder, 'db-migrate-password')).mode & 0o077).toBe(0);
  });

  test('a kill in the middle is followed by a start that recovers', async () => {
    process.kill(Number(readFileSync(join(folder, 'db', 'pid'), 'utf8')), 'SIGKILL');
    await expect.poll(async () => (await script('status')).code).toBe(3);
    expect(await script('start')).toMatchObject({ code: 0 });
  });

  test('stopping says so once, then that nothing was running', async () => {
    expect(await script('stop')).toEqual({ code: 0, words: 'database: stopped\n' });
    expect(await script('stop')).toEqual({ code: 0, words: 'database: was not running\n' });
    expect((await script('status')).code).toBe(3);
  });

  test('an unknown word is answered with what there is', async () => {
    const { code, words } = await script('restart');
    expect(code).toBe(2);
    expect(words).toContain('./docker-free-db.sh status');
  });
});
