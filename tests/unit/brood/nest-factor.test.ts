import { describe, expect, it } from 'vitest';
import { factorNodes, logSd, normalNodes } from '@/lib/brood/nest-factor';

/** The mean of f over the nodes of a standard normal. */
const mean = (f: (z: number) => number) => normalNodes().reduce((sum, { z, weight }) => sum + weight * f(z), 0);

describe('the factor shared by a nest (7-point Gauss–Hermite, Abramowitz & Stegun table 25.10)', () => {
  it.each([
    [0, 1],
    [2, 1],
    [4, 3],
    [6, 15],
    [8, 105],
    [10, 945],
    [12, 10_395],
  ])('integrates z^%d of a standard normal exactly', (power, moment) => {
    expect(mean((z) => z ** power) / moment).toBeCloseTo(1, 12);
    expect(mean((z) => z ** (power + 1))).toBeCloseTo(0, 8);
  });

  it('turns a coefficient of variation of 0.20 into 0.198 on the log scale', () => {
    expect(logSd(0.2)).toBeCloseTo(0.198, 3);
  });

  it('has median 1 and the mean and variation of a log-normal', () => {
    const nodes = factorNodes(0.2);
    const first = nodes.reduce((sum, { rate, weight }) => sum + weight * rate, 0);
    const second = nodes.reduce((sum, { rate, weight }) => sum + weight * rate * rate, 0);
    expect(nodes[3]?.rate).toBe(1);
    expect(first).toBeCloseTo(Math.sqrt(1.04), 9);
    expect(Math.sqrt(second / first ** 2 - 1)).toBeCloseTo(0.2, 7);
  });

  it('is 1 for all when nests do not vary', () => {
    expect(factorNodes(0)).toEqual([{ rate: 1, weight: 1 }]);
  });
});
