import { describe, expect, it } from 'vitest';
import { poissonMean, poissonWeights } from '@/lib/brood/poisson';

describe('Poisson weights', () => {
  it.each([0.001, 0.5, 1, 7.3, 64, 1_000, 25_000])('sum to 1 and average to the mean %d', (mean) => {
    const { first, weights } = poissonWeights(mean);
    const total = weights.reduce((sum, weight) => sum + weight, 0);
    const average = weights.reduce((sum, weight, i) => sum + weight * (first + i), 0);
    expect(total).toBeCloseTo(1, 13);
    expect(Math.abs(average / mean - 1)).toBeLessThan(1e-12);
  });

  it('are e^−m m^n / n! for a small mean', () => {
    const { first, weights } = poissonWeights(2);
    const expected = [1, 2, 2, 8 / 6, 16 / 24].map((term) => term * Math.exp(-2));
    expect(first).toBe(0);
    expected.forEach((value, n) => expect(weights[n]).toBeCloseTo(value, 15));
  });

  it('put everything on no event when nothing is expected', () => {
    expect(poissonWeights(0)).toEqual({ first: 0, weights: Float64Array.of(1) });
  });

  it('average a sequence with its last value going on for ever', () => {
    const sequence = Float64Array.of(0, 0, 1);
    const atLeastTwo = 1 - Math.exp(-3) * (1 + 3);
    expect(poissonMean(sequence, poissonWeights(3))).toBeCloseTo(atLeastTwo, 14);
    expect(poissonMean(sequence, poissonWeights(400))).toBeCloseTo(1, 14);
  });
});
