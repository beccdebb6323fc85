import { binomialTail } from './binomial-tail';
import type { Interval } from './interval';

/** `exact` is Clopper–Pearson; `mid-p` counts the value seen by half and is less cautious. */
export type ExactMethod = 'exact' | 'mid-p';

const HALVINGS = 60;
const EACH_SIDE = 0.025;

/** The share at which a rising function passes `target`, to the last bit that counts. */
function shareWhere(rising: (share: number) => number, target: number): number {
  let low = 0;
  let high = 1;
  for (let step = 0; step < HALVINGS; step += 1) {
    const middle = (low + high) / 2;
    if (rising(middle) < target) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** The lower limit: the share at which seeing this many or more has a chance of 2.5 %. */
function lowerLimit(successes: number, n: number, weight: number): number {
  if (successes === 0) return 0;
  return shareWhere((share) => binomialTail(n, share, { x: successes, weight }), EACH_SIDE);
}

/**
 * The 95 % interval of a share from the binomial law itself, for when a bound is wanted that holds ("0 of 20").
 *
 * Source: Clopper & Pearson 1934; mid-P as in Newcombe 1998, Statistics in Medicine 17:857–872.
 *
 * @param successes how many of them.
 * @param n of how many; 0 gives the interval from 0 to 1.
 */
export function exactInterval(successes: number, n: number, method: ExactMethod = 'exact'): Interval {
  if (n === 0) return { low: 0, high: 1 };
  const weight = method === 'exact' ? 1 : 0.5;
  return { low: lowerLimit(successes, n, weight), high: 1 - lowerLimit(n - successes, n, weight) };
}
