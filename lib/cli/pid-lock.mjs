import { createHash } from 'node:crypto';
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
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

/**
 * Names one life of a process: its id and, where the system tells, when it began, because ids are used again.
 * A process that has ended but that nobody has collected yet counts as gone.
 *
 * @param {number} pid
 * @returns {string | null} null when there is no such process
 */
export function processMark(pid) {
  try {
    if (existsSync('/proc/self/stat')) {
      const fields = readFileSync(`/proc/${pid}/stat`, 'utf8')
        .replace(/^.*\) /s, '')
        .split(' ');
      return /[ZX]/.test(fields[0]) ? null : `${pid} ${fields[19]}`;
    }
    process.kill(pid, 0);
    return String(pid);
  } catch (error) {
    return error.code === 'EPERM' ? String(pid) : null;
  }
}

/** The living process that holds the lock, or null. @param {string} path */
export function lockHolder(path) {
  try {
    const mark = readFileSync(path, 'utf8');
    const pid = Number(mark.split(' ')[0]);
    return processMark(pid) === mark ? pid : null;
  } catch {
    return null;
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
      writeFileSync(path, processMark(process.pid) ?? '', { flag: 'wx' });
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
