import type { DiskRun } from './memory-store';
import type { Weather } from './weather';
import type { Process, World } from './world';

/** A tab's connection to its disk. */
export interface SimConnection {
  run: DiskRun;
  /** Drops a dead connection and opens a new one. */
  reopen(): Promise<void>;
}

/** An error as browsers report it: the quota error is inside the abort. */
function aborted(world: World): Error {
  const error = new Error('aborted');
  error.name = world.pick(['AbortError', 'UnknownError', 'InvalidStateError', 'QuotaExceededError']);
  return error;
}

/**
 * A disk that takes its time before and after each commit, aborts some transactions, and whose connection may die so
 * that every call hangs until it is reopened.
 */
export function simConnection(world: World, process: Process, weather: () => Weather): SimConnection {
  let dead = false;
  const never = () => new Promise<never>(() => undefined);
  const pause = () => world.wait(process, world.chance(0.05) ? world.between(50, 2_000) : world.between(1, 12));
  return {
    async run(work) {
      await pause();
      if (world.chance(weather().hang)) dead = true;
      if (dead) return never();
      if (world.chance(weather().abort)) {
        // Single requests may have succeeded; the transaction has not.
        await pause();
        throw aborted(world);
      }
      const result = work();
      await pause();
      return result;
    },
    async reopen() {
      await world.wait(process, world.between(5, 50));
      dead = false;
    },
  };
}
