import type { WebLock } from './lease';

/**
 * The browser's lock of a name, where it has locks. A dead tab lets go of it at once; a frozen one keeps it, so a lock
 * that is not free says nothing.
 */
export function browserWebLock(name: string): WebLock {
  return async (run) => {
    const locks = globalThis.navigator?.locks;
    if (!locks) return run(null);
    return locks.request(name, { ifAvailable: true }, (lock) => run(lock !== null));
  };
}
