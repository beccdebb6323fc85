import { MAX_OPS_PER_PUSH } from '@/lib/protocol/limits';

/** How much a push may carry at present, and what is known about its failures. */
export interface PushPace {
  limit: number;
  /** First key of the batch the office failed over last, and how often. */
  failedKey: string | null;
  strikes: number;
  /** An operation that the office fails over is being narrowed down. */
  hunting: boolean;
}

/** A fresh start: a batch small enough for a slow line. */
export function newPace(): PushPace {
  return { limit: 25, failedKey: null, strikes: 0, hunting: false };
}

/** After a good answer: carry more. */
export function faster(pace: PushPace): PushPace {
  return { ...pace, limit: Math.min(MAX_OPS_PER_PUSH, pace.limit * 2), failedKey: null, strikes: 0 };
}

/** After a batch of `size` ran out of time, or is to be narrowed down: carry half. */
export function slower(pace: PushPace, size: number): PushPace {
  return { ...pace, limit: Math.max(1, Math.floor(size / 2)), failedKey: null, strikes: 0 };
}

/**
 * After the office failed over a batch.
 *
 * @returns the pace, with `hunting` set once the same batch has failed twice.
 */
export function struck(pace: PushPace, firstKey: string): PushPace {
  const strikes = pace.failedKey === firstKey ? pace.strikes + 1 : 1;
  return { ...pace, failedKey: firstKey, strikes, hunting: pace.hunting || strikes >= 2 };
}
