import { dataDir } from '@/lib/server/env';
import { CommandError } from './command-error';
import { lockHolder, lockPath, tryLock, unlock } from './pid-lock.mjs';
import type { CommandContext } from './run-command';

/**
 * One run on the tests' database per data folder: a second would share its database and ports.
 *
 * @throws CommandError when another run is going on.
 */
export function takeTestTurn({ atEnd }: CommandContext): void {
  const lock = lockPath(dataDir(), 'test');
  if (!tryLock(lock)) {
    const other = 'Give this one its own: DATA_DIR=.data-test-2 DB_PORT=3337 PORT=3200 npm test';
    throw new CommandError(`Another npm test is running here (process ${lockHolder(lock)}).\n${other}`);
  }
  atEnd(async () => unlock(lock));
}
