import { describe, expect, it } from 'vitest';
import { seededRandom } from '@/lib/kit/random';
import { bootstrapInterval } from '@/lib/stats/bootstrap-interval';

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

describe('an interval by drawing again', () => {
  it('of a mean is close to the one from the standard error (seed 3)', () => {
    const random = seededRandom(3);
    const values = Array.from({ length: 400 }, () => random());
    const interval = bootstrapInterval(values, mean, { random, draws: 2000 });
    // A uniform law on [0, 1) has the variance 1/12.
    const half = 1.96 * Math.sqrt(1 / 12 / 400);
    expect(interval?.low).toBeCloseTo(mean(values) - half, 2);
    expect(interval?.high).toBeCloseTo(mean(values) + half, 2);
  });

  it('is refused when most draws have no value', () => {
    const drawn = () => bootstrapInterval([1, 2, 3], () => null, { random: seededRandom(1), draws: 50 });
    expect(drawn()).toBeNull();
  });
});
