import 'server-only';
import { describeError, log } from '@/lib/server/log/log';

const running = new Set<Promise<void>>();

/**
 * Goes on with work after the answer has been given, so that the time of the answer tells nothing about it. What
 * fails is logged; what a crash cuts off is lost, so only acts that a person can simply ask for again belong here.
 */
export function inBackground(what: string, work: () => Promise<void>): void {
  const promise = work()
    .catch((error: unknown) => log({ event: 'background-failed', what, ...describeError(error) }))
    .finally(() => running.delete(promise));
  running.add(promise);
}

/** Resolves when all work begun so far has ended. */
export async function backgroundDone(): Promise<void> {
  await Promise.all(running);
}
