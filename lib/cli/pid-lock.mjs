import { createHash } from 'node:crypto';
import { readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';

/**
 * The path of a lock file for something that only one process may do in a folder at a time.
 *
 * @param {string} folder the folder the work is done in
 * @param {string} what a word for the work, such as `install`
 */
export function lockPath(folder, what) {
  return join(tmpdir(), `undereave-${createHash('sha256').update(folder).digest('hex').slice(0, 16)}-${what}.lock`);
}

/** The living process that holds the lock, or null. @param {string} path */
export function lockHolder(path) {
  try {
    const pid = Number(readFileSync(path, 'utf8'));
    process.kill(pid, 0);
    return pid;
  } catch (error) {
    return error.code === 'EPERM' ? 0 : null;
  }
}

/**
 * Tries to take a lock; a lock left by a process that is gone is taken over.
 *
 * @param {string} path from `lockPath`
 * @returns {boolean} whether it is ours now
 */
export function tryLock(path) {
  for (let attempt = 0; attempt < 2; attempt++) {
    try {
      writeFileSync(path, String(process.pid), { flag: 'wx' });
      return true;
    } catch (error) {
      if (error.code !== 'EEXIST') throw error;
      if (lockHolder(path) !== null) return false;
      rmSync(path, { force: true });
    }
  }
  return false;
}

/** Gives a lock back. @param {string} path */
export function unlock(path) {
  rmSync(path, { force: true });
}

/**
 * Runs work under a lock, waiting for whoever holds it.
 *
 * @template T
 * @param {string} path from `lockPath`
 * @param {() => Promise<T>} work
 * @param {(holder: number) => void} onWait called once when there is somebody to wait for
 * @returns {Promise<T>}
 */
export async function withLock(path, work, onWait = () => {}) {
  let told = false;
  while (!tryLock(path)) {
    if (!told) onWait(lockHolder(path) ?? 0);
    told = true;
    await sleep(500);
  }
  try {
    return await work();
  } finally {
    unlock(path);
  }
}
