import type { Change, Snapshot } from './store';

/** Sets operations aside that the office fails over, so that they hold up nothing; they are retried daily. */
export function markSuspect(now: number) {
  return ({ ops }: Snapshot): Change<void> => {
    const waiting = [...ops.values()].filter(({ state }) => state === 'queued' || state === 'suspect');
    return { result: undefined, ops: waiting.map((row) => ({ ...row, state: 'suspect', triedAt: now })) };
  };
}
