/** The only way the core waits. */
export interface Timers {
  /** Calls `fire` after `ms`, unless the returned function was called before. */
  after(ms: number, fire: () => void): () => void;
}

/** Thrown by `within` when the time is over. */
class TimedOut extends Error {
  override name = 'TimedOut';
}

/** Resolves after `ms`, or at once when `wake` fires. Never rejects. */
export function sleep(timers: Timers, ms: number, wake?: AbortSignal): Promise<void> {
  if (wake?.aborted) return Promise.resolve();
  return new Promise((resolve) => {
    const end = () => {
      cancel();
      wake?.removeEventListener('abort', end);
      resolve();
    };
    const cancel = timers.after(ms, end);
    wake?.addEventListener('abort', end);
  });
}

/**
 * The promise's outcome, or `TimedOut` after `ms`. The work itself goes on and may still succeed later:
 * the caller must be able to do it twice.
 */
export function within<T>(timers: Timers, ms: number, work: Promise<T>): Promise<T> {
  return new Promise((resolve, reject) => {
    const cancel = timers.after(ms, () => reject(new TimedOut(`no answer within ${ms} ms`)));
    work.then(resolve, reject).finally(cancel);
  });
}
