import type { Store } from './store';
import { type Timers, within } from './timers';

/** A live connection answers a cheap read long before this. */
const PROBE_MS = 2_000;

/**
 * Checks the storage connection after the app was in the background, where phones drop it without a word.
 * A connection that does not answer is dropped and opened anew.
 *
 * @returns true when the storage answers in the end.
 */
export async function checkConnection({ store, timers }: { store: Store; timers: Timers }): Promise<boolean> {
  const answers = () => within(timers, PROBE_MS, store.probe());
  try {
    await answers();
    return true;
  } catch {
    return within(timers, PROBE_MS, store.reopen())
      .then(answers)
      .then(
        () => true,
        () => false,
      );
  }
}
