import { describe, expect, it } from 'vitest';
import { DEFAULT_DURATIONS, durationsFor } from '@/lib/brood/durations';
import { DEFAULT_SETTINGS } from '@/lib/brood/settings';
import { developmentRate, summedRate } from '@/lib/brood/temperature/development-rate';
import { temperatureSettings } from '@/lib/brood/temperature/temperature-settings';

const { row } = durationsFor('Polistes exclamans', DEFAULT_DURATIONS);
const RATE = temperatureSettings(DEFAULT_SETTINGS.values, row.referenceC);
const TOTAL = row.egg + row.larva + row.capped;

/** Days that so many days at the reference take at another temperature. */
const daysAt = (celsius: number, days: number, settings = RATE) => days / developmentRate(celsius, settings);

/** Degree-days above 10 °C of a day that follows a sine. */
function degreeDays(mean: number, amplitude: number): number {
  const day = Array.from({ length: 20_000 }, (_, i) => mean + amplitude * Math.sin((2 * Math.PI * (i + 0.5)) / 20_000));
  return summedRate(day, (celsius) => developmentRate(celsius, RATE)) * (RATE.reference - RATE.base);
}

describe('the temperature model with default numbers (M rows: coded as written, no biology)', () => {
  it.each([
    [20, 67.5, 16.5],
    [25, 45, 11],
    [30, 33.75, 8.25],
  ])('M C18: at a constant %d °C egg to adult takes %d days, the egg %d', (celsius, total, egg) => {
    expect(Math.abs(daysAt(celsius, TOTAL) - total)).toBeLessThan(0.01);
    expect(Math.abs(daysAt(celsius, row.egg) - egg)).toBeLessThan(0.01);
  });

  it('M C19: at 10 °C and at 5 °C nothing develops', () => {
    expect([developmentRate(10, RATE), developmentRate(5, RATE)]).toEqual([0, 0]);
  });

  it('M C20: at 35 °C egg to adult takes the 29.35 days of 33 °C', () => {
    expect(Math.abs(daysAt(35, TOTAL) - 29.35)).toBeLessThan(0.01);
    expect(daysAt(35, TOTAL)).toBe(daysAt(33, TOTAL));
  });

  it.each([
    { id: 'C21', mean: 12, expected: 3.6265, tolerance: 0.005 },
    { id: 'C22', mean: 20, expected: 10, tolerance: 0.001 },
    { id: 'C23', mean: 10, expected: 2.5465, tolerance: 0.005 },
    { id: 'C23', mean: 8, expected: 1.6265, tolerance: 0.005 },
  ])('M $id: a sine of $mean ± 8 °C makes $expected degree-days a day (analytic)', ({ mean, expected, tolerance }) => {
    expect(Math.abs(degreeDays(mean, 8) - expected)).toBeLessThan(tolerance);
  });

  it('M C21: the mean of that day alone would make 2.0', () => {
    expect(developmentRate(12, RATE) * 15).toBeCloseTo(2, 12);
  });

  it('M C24: 1.3 °C more than 22 shorten 56.25 days to 50.75 (contrast of boxes: Nadeau & Stamp 2003)', () => {
    const [cool, warm] = [daysAt(22, TOTAL), daysAt(23.3, TOTAL)];
    expect(Math.abs(cool - 56.25)).toBeLessThan(0.02);
    expect(Math.abs(warm - 50.75)).toBeLessThan(0.02);
    expect(Math.abs(cool - warm - 5.5)).toBeLessThan(0.02);
  });

  it.each([
    { stage: 'egg', base: 13.8, sum: 37, days: 5.97 },
    { stage: 'larva', base: 8.5, sum: 422.4, days: 36.73 },
    { stage: 'pupa', base: 13.2, sum: 272.3, days: 40.04 },
  ])(
    'M C28: the $stage of Osmia bicornis, $base °C and $sum degree-days, takes $days days at 20 °C (a-priori values of a public model)',
    (row) => {
      const settings = { ...RATE, base: row.base };
      expect(Math.abs(daysAt(20, row.sum / (settings.reference - row.base), settings) - row.days)).toBeLessThan(0.01);
    },
  );
});
