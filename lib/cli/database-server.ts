import { CommandError } from './command-error';
import { runChild } from './child';
import type { CommandContext } from './run-command';

const SCRIPT = './docker-free-db.sh';
const NOT_RUNNING = 3;

/**
 * Starts this folder's MariaDB (installing it when missing). One that was already running is left running at the
 * end; one that this call started is stopped then.
 *
 * @throws CommandError with the script's own words when it cannot be started.
 */
export async function startDatabaseServer({ progress, signal, atEnd }: CommandContext): Promise<void> {
  const before = await runChild({ command: SCRIPT, args: ['status'], output: 'keep' });
  if (before.code === NOT_RUNNING) atEnd(stopDatabaseServer);
  await progress.step('starting MariaDB', async () => {
    const { code } = await runChild({ command: SCRIPT, args: ['start'], output: 'show', signal });
    if (code !== 0) throw new CommandError('MariaDB could not be started; its message is above.');
  });
}

/** Stops this folder's MariaDB. */
export async function stopDatabaseServer(): Promise<void> {
  await runChild({ command: SCRIPT, args: ['stop'], output: 'show' });
}
