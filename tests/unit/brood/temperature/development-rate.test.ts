import { describe, expect, it } from 'vitest';
import { developmentRate, summedRate } from '@/lib/brood/temperature/development-rate';
import vectors from '@/tests/fixtures/temperature/temperature.json';

const RATE = { base: 10, plateau: 33, limit: 42, reference: 25 };

/** The Brière-1 rate of *Lobesia botrana* eggs (Brière et al. 1999; parameters as collected in devRate). */
function briere(celsius: number): number {
  const { a, T0, TL } = vectors.briere1[0] ?? { a: 0, T0: 0, TL: 0 };
  return celsius <= T0 || celsius >= TL ? 0 : a * celsius * (celsius - T0) * Math.sqrt(TL - celsius);
}

describe('the development rate (programme default: linear above 10, level above 33, none above 42 °C)', () => {
  it.each([
    [9, 0],
    [10, 0],
    [17.5, 0.5],
    [25, 1],
    [33, 23 / 15],
    [38, 23 / 15],
    [42, 23 / 15],
    [42.01, 0],
  ])('at %d °C is %d of the rate at 25', (celsius, rate) => {
    expect(developmentRate(celsius, RATE)).toBeCloseTo(rate, 12);
  });

  it('refuses a reference at which nothing develops', () => {
    expect(() => developmentRate(20, { ...RATE, reference: 10 })).toThrow(RangeError);
  });
});

describe('rate summation', () => {
  it.each(vectors.rate_summation_briere_sine)(
    'sums the rates of a day of $mean ± $amplitude °C, not the rate of its mean (devRate parameters, computed with scipy)',
    ({
      mean,
      amplitude,
      rate_24_point_midpoint: printed,
      rate_per_day_exact: exact,
      rate_at_mean_temperature: atMean,
    }) => {
      const day = (n: number) =>
        Array.from({ length: n }, (_, i) => mean + amplitude * Math.sin((2 * Math.PI * (i + 0.5)) / n));
      expect(Math.abs(summedRate(day(24), briere) - printed)).toBeLessThan(1e-6);
      expect(Math.abs(summedRate(day(20_000), briere) - exact)).toBeLessThan(1e-6);
      expect(Math.abs(briere(mean) - atMean)).toBeLessThan(1e-9);
      expect(Math.abs(summedRate(day(24), briere) - atMean)).toBeGreaterThan(0.004);
    },
  );
});
