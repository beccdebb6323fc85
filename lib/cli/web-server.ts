import type { ChildProcess } from 'node:child_process';
import { createConnection } from 'node:net';
import { join } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { pathToFileURL } from 'node:url';
import { type ChildOptions, hasEnded, startChild } from './child';
import { CommandError } from './command-error';

/** Where a server listens and what it is told. */
export interface WebServerOptions extends Pick<ChildOptions, 'env' | 'output' | 'ownGroup'> {
  port: number;
}

const HOST = '127.0.0.1';
const START_MS = 60_000;

/** Does anything listen on this port of loopback? */
function portInUse(port: number): Promise<boolean> {
  return new Promise((resolve) => {
    const socket = createConnection({ port, host: HOST });
    const answer = (inUse: boolean) => {
      socket.destroy();
      resolve(inUse);
    };
    socket.once('connect', () => answer(true));
    socket.once('error', () => answer(false));
  });
}

/** @throws CommandError when something already listens on the port. */
export async function requireFreePort(port: number): Promise<void> {
  if (!(await portInUse(port))) return;
  throw new CommandError(
    `Port ${port} is taken by another program. Stop it, or choose another port with PORT=${port + 1}.`,
  );
}

/**
 * Starts the built application. The child is the server itself, so its process id is the one to stop.
 *
 * @throws CommandError when the port is taken.
 */
export async function startWebServer({ port, env, ...how }: WebServerOptions): Promise<ChildProcess> {
  await requireFreePort(port);
  const next = join(process.cwd(), 'node_modules', 'next', 'dist', 'bin', 'next');
  const guard = pathToFileURL(join(process.cwd(), 'lib', 'cli', 'refuse-trace.mjs')).href;
  return startChild({
    command: process.execPath,
    args: ['--import', guard, next, 'start', '--hostname', HOST, '--port', String(port)],
    env: { NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1', PORT: String(port), ...env },
    ...how,
  });
}

async function isHealthy(port: number): Promise<boolean> {
  try {
    return (await fetch(`http://${HOST}:${port}/api/health`, { signal: AbortSignal.timeout(3_000) })).ok;
  } catch {
    return false;
  }
}

/**
 * Waits until the server says it is well.
 *
 * @throws CommandError when it ends or stays silent for a minute.
 */
export async function waitUntilHealthy(server: ChildProcess, port: number, signal?: AbortSignal): Promise<void> {
  const deadline = performance.now() + START_MS;
  while (!(await isHealthy(port))) {
    if (signal?.aborted) return;
    if (hasEnded(server)) throw new CommandError('The server ended while starting; its message is above.');
    if (performance.now() > deadline)
      throw new CommandError(`No healthy answer from http://${HOST}:${port}/api/health for 60 s.`);
    await sleep(100);
  }
}
