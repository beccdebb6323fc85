import { execFile } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { promisify } from 'node:util';
import { createConnection } from 'mariadb';
import { endChild } from '@/lib/cli/child';
import { startWebServer, waitUntilHealthy } from '@/lib/cli/web-server';
import { freePort } from './server';

/** A web server and a MariaDB of its own, so that a test may kill either without disturbing anybody. */
export interface OwnStack {
  origin: string;
  /** Ends the web server with SIGKILL. */
  killServer(): Promise<void>;
  /** Starts the web server again and waits until it is well. */
  startServer(): Promise<void>;
  /** Ends MariaDB with SIGKILL. */
  killDatabase(): Promise<void>;
  /** Starts MariaDB again; it recovers from its logs. */
  startDatabase(): Promise<void>;
  /** Reads rows straight from MariaDB, past the application. */
  rows(sql: string, values?: unknown[]): Promise<Record<string, unknown>[]>;
  close(): Promise<void>;
}

/** The process id of the stack's MariaDB. */
function databasePid(folder: string): number {
  const file = ['pid', 'mariadbd.pid'].map((name) => join(folder, 'db', name)).find(existsSync);
  if (!file) throw new Error(`no process id of MariaDB in ${folder}`);
  return Number(readFileSync(file, 'utf8'));
}

async function untilGone(pid: number): Promise<void> {
  for (;;) {
    try {
      process.kill(pid, 0);
    } catch {
      return;
    }
    await sleep(20);
  }
}

/** Starts MariaDB, loads the demo season and serves the built application, all on free ports in a folder of their own. */
export async function startOwnStack(): Promise<OwnStack> {
  const folder = mkdtempSync(join(tmpdir(), 'undereave-stack-'));
  const [port, databasePort] = [await freePort(), await freePort()];
  const origin = `http://127.0.0.1:${port}`;
  const env = {
    DATA_DIR: folder,
    DB_PORT: String(databasePort),
    DB_NAME: 'undereave',
    DB_FLUSH: '1',
    PORT: String(port),
    NEXTAUTH_URL: origin,
  };
  // Not the blocking form: while this process stands still, connections it keeps open would go stale unnoticed.
  const run = async (command: string, ...args: string[]) => {
    await promisify(execFile)(command, args, { env: { ...process.env, ...env } });
  };
  const script = (verb: string) => run('./docker-free-db.sh', verb);
  await script('start');
  await run('npm', 'run', '--silent', 'demo');
  const serve = async () => {
    const server = await startWebServer({ port, env, output: { file: join(folder, 'server.log') }, ownGroup: false });
    await waitUntilHealthy(server, port);
    return server;
  };
  let server = await serve();
  return {
    origin,
    killServer: async () => {
      server.kill('SIGKILL');
      if (server.pid) await untilGone(server.pid);
    },
    startServer: async () => {
      server = await serve();
    },
    killDatabase: async () => {
      const pid = databasePid(folder);
      process.kill(pid, 'SIGKILL');
      await untilGone(pid);
    },
    startDatabase: () => script('start'),
    rows: async (sql, values) => {
      const password = readFileSync(join(folder, 'db-password'), 'utf8').trim();
      const connection = await createConnection({
        host: '127.0.0.1',
        port: databasePort,
        user: 'undereave',
        password,
        database: 'undereave',
      });
      try {
        return (await connection.query(sql, values)) as Record<string, unknown>[];
      } finally {
        await connection.end();
      }
    },
    close: async () => {
      await endChild(server);
      await script('stop');
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
