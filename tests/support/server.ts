import { copyFileSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import type { ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { type AddressInfo, createServer } from 'node:net';
import { join } from 'node:path';
import { endChild, hasEnded } from '@/lib/cli/child';
import { startWebServer, waitUntilHealthy } from '@/lib/cli/web-server';
import { dataDir } from '@/lib/server/env';

/** Which database and port a server under test uses. */
export interface TestServerOptions {
  /** Name of an existing, migrated database. */
  database: string;
  /** A free port is chosen when absent. */
  port?: number;
  env?: Record<string, string>;
}

/** The built application, running as a process of its own that can be killed and started again. */
export interface TestServer {
  origin: string;
  /** The folder it keeps its files in. */
  dataDir: string;
  /** Ends it at once with SIGKILL, as a power cut would. */
  kill(): Promise<void>;
  /** Starts it again on the same port, database and folder after `kill`. */
  start(): Promise<void>;
  /** Stops it and deletes its folder. */
  close(): Promise<void>;
}

/** A port of loopback that nothing listens on at this moment. */
export async function freePort(): Promise<number> {
  const probe = createServer().listen(0, '127.0.0.1');
  await once(probe, 'listening');
  const { port } = probe.address() as AddressInfo;
  probe.close();
  await once(probe, 'close');
  return port;
}

/** A data folder of its own inside the tests' one, with the database passwords in it. */
function ownDataDir(): string {
  const parent = join(dataDir(), 'servers');
  mkdirSync(parent, { recursive: true });
  const folder = mkdtempSync(join(parent, 's-'));
  for (const name of ['db-password', 'db-migrate-password']) copyFileSync(join(dataDir(), name), join(folder, name));
  return folder;
}

async function killNow(server: ChildProcess): Promise<void> {
  if (hasEnded(server)) return;
  const gone = once(server, 'exit');
  server.kill('SIGKILL');
  await gone;
}

/** Starts the built application (`npm run build` first) for a test; resolves when it says it is well. */
export async function startTestServer({ database, port, env }: TestServerOptions): Promise<TestServer> {
  const chosen = port ?? (await freePort());
  const origin = `http://127.0.0.1:${chosen}`;
  const folder = ownDataDir();
  const start = async () => {
    const server = await startWebServer({
      port: chosen,
      output: { file: join(folder, 'server.log') },
      ownGroup: false,
      env: { DATA_DIR: folder, DB_NAME: database, NEXTAUTH_URL: origin, ...env },
    });
    await waitUntilHealthy(server, chosen);
    return server;
  };
  let server = await start();
  return {
    origin,
    dataDir: folder,
    kill: () => killNow(server),
    start: async () => {
      server = await start();
    },
    close: async () => {
      await endChild(server);
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
