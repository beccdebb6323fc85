import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { buildServiceWorker } from './build-sw';
import { runChild } from './child';
import { CommandError } from './command-error';
import { lockPath, withLock } from './pid-lock.mjs';
import type { CommandContext } from './run-command';
import { sourceHash } from './source-hash';

const STAMP = join('.next', 'UNDEREAVE_BUILD');
/** Turbopack remembers such a failure and repeats it until the folder is gone. */
const REMEMBERED_FAILURE = /unexpected Turbopack error|TurbopackInternalError|creating new process/i;

/** Is `.next` a finished build of the sources as they are now? */
function isBuilt(root: string, hash: string): boolean {
  const stamp = join(root, STAMP);
  const workers = ['sw.js', 'field/brood-worker.js'].every((name) => existsSync(join(root, 'public', name)));
  return workers && existsSync(stamp) && readFileSync(stamp, 'utf8') === hash;
}

async function nextBuild(root: string, signal: AbortSignal): Promise<void> {
  const { code, output } = await runChild({
    command: process.execPath,
    args: [join(root, 'node_modules', 'next', 'dist', 'bin', 'next'), 'build'],
    env: { NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' },
    output: 'keep',
    signal,
  });
  if (code === 0) return;
  if (REMEMBERED_FAILURE.test(output)) rmSync(join(root, '.next'), { recursive: true, force: true });
  throw new CommandError(`${output.trimEnd()}\n\nThe application could not be built.`);
}

/**
 * Builds the application and its service worker unless the last build was made from the same sources.
 * Two commands that want a build at once take turns.
 */
export async function buildApplication({ progress, signal }: CommandContext, root = process.cwd()): Promise<void> {
  const build = async () => {
    const hash = sourceHash(root);
    if (isBuilt(root, hash)) return progress.note('the build is up to date');
    rmSync(join(root, STAMP), { force: true });
    await progress.step('building the application', () => nextBuild(root, signal));
    await progress.step('building the service worker', async () => buildServiceWorker(root));
    mkdirSync(join(root, '.next'), { recursive: true });
    writeFileSync(join(root, STAMP), hash);
  };
  const waiting = (pid: number) => progress.note(`waiting for another build (process ${pid})`);
  await withLock(lockPath(root, 'build'), build, waiting);
}
