/** A source of numbers in [0, 1): `Math.random` at the edges, a seeded generator in tests. */
export type Random = () => number;

/**
 * A small seeded generator (mulberry32) for tests, demo data and replayable schedules.
 *
 * @param seed any integer; equal seeds give equal sequences.
 * @returns a `Random`. Not for secrets.
 */
export function seededRandom(seed: number): Random {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}
