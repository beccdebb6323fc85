import type { Clock } from './clock';

/** One name for the time since this page or process started. */
const bootId = crypto.randomUUID();

/** The real clock of this machine; handed in at the edges, never reached for by a core. */
export const systemClock: Clock = {
  now: () => Date.now(),
  mono: () => performance.now(),
  boot: () => bootId,
};
