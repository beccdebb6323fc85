import { describe, expect, it } from 'vitest';
import { seededSample } from '@/lib/stats/seeded-sample';

const ITEMS = Array.from({ length: 40 }, (_, at) => at);

describe('a seeded sample', () => {
  it('is the same for the same list and seed, and another for another seed', () => {
    const drawn = seededSample(ITEMS, { share: 0.1, seed: 7 });
    expect(seededSample(ITEMS, { share: 0.1, seed: 7 })).toEqual(drawn);
    expect(seededSample(ITEMS, { share: 0.1, seed: 8 })).not.toEqual(drawn);
  });

  it.each([
    [0.1, 40, 4],
    [0.05, 40, 2],
    [0.05, 3, 1],
    [0.1, 0, 0],
    [0.1, 10, 1],
    [0.05, 20, 1],
    [1, 5, 5],
  ])('of the share %f of %i things has %i, rounded up', (share, size, expected) => {
    expect(seededSample(ITEMS.slice(0, size), { share, seed: 1 })).toHaveLength(Math.min(size, expected));
  });

  it('draws nothing twice and everything about equally often (seeds 1 to 2000)', () => {
    const counts = ITEMS.map(() => 0);
    for (let seed = 1; seed <= 2000; seed += 1) {
      const drawn = seededSample(ITEMS, { share: 0.1, seed });
      expect(new Set(drawn).size).toBe(drawn.length);
      for (const item of drawn) counts[item] = (counts[item] ?? 0) + 1;
    }
    // 200 each; five standard deviations of a binomial count with p = 0.1.
    for (const count of counts) expect(Math.abs(count - 200)).toBeLessThan(5 * Math.sqrt(2000 * 0.1 * 0.9));
  });
});
