import { type Interval, Z_95 } from './interval';

/**
 * The 95 % interval of an estimate that is about normal, kept within the values it can take.
 *
 * @param value the estimate.
 * @param variance of the estimate, not of the data.
 * @param limits smallest and largest value the quantity can have.
 */
export function normalInterval(value: number, variance: number, limits: Interval): Interval {
  const half = Z_95 * Math.sqrt(variance);
  return { low: Math.max(limits.low, value - half), high: Math.min(limits.high, value + half) };
}
