import type { DevelopmentClock } from './development-clock';

const DAY_MS = 86_400_000;

/** Days of the durations that a clock counts over a stretch of time (epoch milliseconds). */
export function developmentDays({ rates }: DevelopmentClock, [start, end]: readonly [number, number]): number {
  let sum = 0;
  let rate = 1;
  let since = start;
  for (const [at, next] of rates) {
    if (at >= end) break;
    if (at > since) {
      sum += (at - since) * rate;
      since = at;
    }
    rate = next;
  }
  return (sum + (end - since) * rate) / DAY_MS;
}
