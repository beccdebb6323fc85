import { execFileSync } from 'node:child_process';
import { applyTestEnvironment } from '@/lib/cli/test-environment.mjs';
import { dropAbandonedDatabases } from './database';

/**
 * Makes sure the tests' MariaDB runs. `npm test` has started it already and stops it at the end; after tests run
 * by hand it stays up for the next time.
 */
export async function setup(): Promise<void> {
  applyTestEnvironment();
  execFileSync('./docker-free-db.sh', ['start'], { stdio: ['ignore', 'ignore', 'inherit'] });
  await dropAbandonedDatabases();
}
