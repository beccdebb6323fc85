import type { Interval } from './interval';
import { wilsonInterval } from './wilson-interval';

/** Agreement over several combs. */
export interface PooledAgreement {
  /** Things compared. */
  n: number;
  agreed: number;
  share: number;
  /** 95 %, Wilson's. Cells of one comb are not quite independent of each other, so this is at its narrowest. */
  interval: Interval;
}

/**
 * The share of agreement over everything compared; null when that is nothing.
 *
 * @param parts how many were compared and agreed in each comb.
 */
export function pooledAgreement(parts: readonly { n: number; agreed: number }[]): PooledAgreement | null {
  const n = parts.reduce((sum, part) => sum + part.n, 0);
  const agreed = parts.reduce((sum, part) => sum + part.agreed, 0);
  return n === 0 ? null : { n, agreed, share: agreed / n, interval: wilsonInterval(agreed, n) };
}
