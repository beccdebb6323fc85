import { type Interval, Z_95 } from './interval';

/**
 * The 95 % interval of a share by Wilson's method, without continuity correction.
 *
 * Source: Wilson 1927; compared in Newcombe 1998, Statistics in Medicine 17:857–872.
 *
 * @param successes how many of them.
 * @param n of how many; 0 gives the interval from 0 to 1.
 */
export function wilsonInterval(successes: number, n: number): Interval {
  if (n === 0) return { low: 0, high: 1 };
  const share = successes / n;
  const z2n = Z_95 ** 2 / n;
  const middle = share + z2n / 2;
  const half = Z_95 * Math.sqrt((share * (1 - share)) / n + z2n / (4 * n));
  return {
    low: successes === 0 ? 0 : Math.max(0, (middle - half) / (1 + z2n)),
    high: successes === n ? 1 : Math.min(1, (middle + half) / (1 + z2n)),
  };
}
