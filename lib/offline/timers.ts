/** The only way the core waits. */
export interface Timers {
  /** Resolves after `ms`, or at once when `wake` fires. Never rejects. */
  sleep(ms: number, wake?: AbortSignal): Promise<void>;
}

/** Thrown by `within` when the time is over. */
export class TimedOut extends Error {
  override name = 'TimedOut';
}

/**
 * The promise's outcome, or `TimedOut` after `ms`. The work itself goes on and may still succeed later:
 * the caller must be able to do it twice.
 */
export async function within<T>(timers: Timers, ms: number, work: Promise<T>): Promise<T> {
  const over = new AbortController();
  const alarm = timers.sleep(ms, over.signal).then(() => {
    throw new TimedOut(`no answer within ${ms} ms`);
  });
  // The alarm also fires when the work is done and it is woken; nobody listens then.
  alarm.catch(() => undefined);
  try {
    return await Promise.race([work, alarm]);
  } finally {
    over.abort();
  }
}
