import { rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { tmpdir } from 'node:os';
import { afterEach, expect, test } from 'vitest';
import { lockHolder, lockPath, tryLock, unlock, withLock } from '@/lib/cli/pid-lock.mjs';

const path = join(tmpdir(), `undereave-lock-test-${process.pid}`);
/** Larger than any process id Linux hands out. */
const NOBODY = 2 ** 22 + 1;

afterEach(() => rmSync(path, { force: true }));

test('the same folder and work give the same lock, others another', () => {
  expect(lockPath('/a', 'build')).toBe(lockPath('/a', 'build'));
  expect(new Set([lockPath('/a', 'build'), lockPath('/b', 'build'), lockPath('/a', 'test')]).size).toBe(3);
});

test('a lock can be taken once until it is given back', () => {
  expect(tryLock(path)).toBe(true);
  expect(tryLock(path)).toBe(false);
  expect(lockHolder(path)).toBe(process.pid);
  unlock(path);
  expect(tryLock(path)).toBe(true);
});

test('a lock whose owner is gone is taken over', () => {
  writeFileSync(path, `${NOBODY} 1`);
  expect(lockHolder(path)).toBeNull();
  expect(tryLock(path)).toBe(true);
});

test('a lock is not kept alive by another process that was given the same id later', () => {
  writeFileSync(path, `${process.pid} 1`);
  expect(lockHolder(path)).toBeNull();
});

test('work under a lock waits for its owner, says so once, and gives the lock back even when it fails', async () => {
  expect(tryLock(path)).toBe(true);
  const waited: number[] = [];
  setTimeout(() => unlock(path), 700);
  await expect(
    withLock(
      path,
      () => Promise.reject(new Error('broke')),
      (pid) => void waited.push(pid),
    ),
  ).rejects.toThrow('broke');
  expect(waited).toEqual([process.pid]);
  expect(lockHolder(path)).toBeNull();
});
