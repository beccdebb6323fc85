import { describe, expect, it } from 'vitest';
import { seededRandom } from '@/lib/kit/random';

describe('the seeded generator', () => {
  it('repeats itself for a seed and differs for another', () => {
    const draw = (seed: number) => Array.from({ length: 5 }, seededRandom(seed));
    expect(draw(7)).toEqual(draw(7));
    expect(draw(7)).not.toEqual(draw(8));
  });

  it('stays within [0, 1) and fills it evenly', () => {
    const random = seededRandom(2026);
    const tenths = new Array<number>(10).fill(0);
    const values = Array.from({ length: 10_000 }, random);
    for (const value of values) tenths[Math.floor(value * 10)] = (tenths[Math.floor(value * 10)] ?? 0) + 1;
    expect(Math.min(...values)).toBeGreaterThanOrEqual(0);
    expect(Math.max(...values)).toBeLessThan(1);
    for (const count of tenths) expect(Math.abs(count - 1_000)).toBeLessThan(150);
  });
});
