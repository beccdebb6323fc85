import { describe, expect, it } from 'vitest';
import { normalNodes } from '@/lib/brood/nest-factor';

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
});
