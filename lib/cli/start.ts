import type { ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { database } from '@/lib/server/db/database';
import { authSecret, port, publicUrl } from '@/lib/server/env';
import { buildApplication } from './build-application';
import { endChild, hasEnded } from './child';
import { startDatabaseServer } from './database-server';
import { demoSignInLines, loadDemoWhenEmpty } from './demo-season';
import { migrateDatabase } from './migrate-database';
import { type CommandContext, type Outcome, runCommand } from './run-command';
import { requireFreePort, startWebServer, waitUntilHealthy } from './web-server';

/** Brings the database to where the server can use it; returns what to tell about signing in. */
async function prepareData(context: CommandContext): Promise<string[]> {
  await startDatabaseServer(context);
  await migrateDatabase(context.progress);
  try {
    await loadDemoWhenEmpty(context.progress);
    return await demoSignInLines();
  } finally {
    await database().sequelize.close();
  }
}

async function serve({ progress, signal, atEnd }: CommandContext): Promise<ChildProcess> {
  const env = { NEXTAUTH_URL: publicUrl(), NEXTAUTH_SECRET: authSecret() };
  const server = await startWebServer({ port: port(), env, output: 'show' });
  atEnd(() => endChild(server));
  await progress.step('starting the server', () => waitUntilHealthy(server, port(), signal));
  return server;
}

/** Resolves with code 0 when we are told to stop, with 1 when the server ends by itself. */
async function untilStopped(server: ChildProcess, signal: AbortSignal): Promise<Outcome> {
  if (signal.aborted) return { code: 0 };
  const stopped = new Promise<Outcome>((resolve) => signal.addEventListener('abort', () => resolve({ code: 0 })));
  const ended = hasEnded(server) ? Promise.resolve() : once(server, 'close');
  return Promise.race([stopped, ended.then(() => ({ code: 1, lastLine: 'The server ended by itself; see above.' }))]);
}

/** `npm start`: from a fresh clone to a running application, and a clean stop on Ctrl-C. */
await runCommand(async (context) => {
  await requireFreePort(port());
  const signIns = await prepareData(context);
  await buildApplication(context);
  const server = await serve(context);
  for (const line of ['', `Undereave is at ${publicUrl()}`, ...signIns, '', 'Ctrl-C stops it.']) console.log(line);
  return untilStopped(server, context.signal);
});
