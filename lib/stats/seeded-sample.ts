import { seededRandom } from '@/lib/kit/random';

/** How much is drawn, and from which seed. */
export interface SampleSize {
  /** Share of the items, from 0 to 1; rounded up, so that a short list gives one. */
  share: number;
  seed: number;
}

/**
 * A simple random sample without replacement that anybody can draw again: equal lists and seeds give equal samples.
 *
 * Source: Knuth, The Art of Computer Programming 2, algorithm P (shuffling), stopped early.
 *
 * @param items in an order that does not depend on chance.
 */
export function seededSample<T>(items: readonly T[], { share, seed }: SampleSize): T[] {
  const random = seededRandom(seed);
  const pool = [...items];
  const size = Math.min(pool.length, Math.ceil(pool.length * share - 1e-9));
  return Array.from({ length: size }, () => {
    const at = Math.floor(random() * pool.length);
    return pool.splice(at, 1);
  }).flat();
}
