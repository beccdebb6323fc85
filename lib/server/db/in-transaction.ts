import 'server-only';
import type { Transaction } from 'sequelize';
import { isRetryable } from './database-errors';
import { database } from './database';

/** How often a whole transaction is run before its error is passed on. */
export const MAX_TRIES = 5;

/** Waits before the next try: random-free and growing, long enough for the other writer to finish. */
const WAITS_MS = [5, 20, 60, 150];

function wait(ms: number): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, ms));
}

/**
 * Runs a closure in a transaction, and the whole closure again when the database asks for it (deadlock, lock
 * timeout, snapshot conflict, node not ready) or the connection was lost. A single statement is never retried:
 * after such an error everything the transaction read may be stale.
 *
 * The closure must be repeatable: it works on its arguments only and leaves nothing behind but rows.
 *
 * @param work gets the transaction, to be passed to every query.
 * @throws the last error when `MAX_TRIES` were not enough.
 */
export async function inTransaction<T>(work: (transaction: Transaction) => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt++) {
    try {
      return await database().sequelize.transaction(work);
    } catch (error) {
      if (attempt >= MAX_TRIES || !isRetryable(error)) throw error;
      await wait(WAITS_MS[attempt - 1] ?? 0);
    }
  }
}
