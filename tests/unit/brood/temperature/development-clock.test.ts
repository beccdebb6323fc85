import { describe, expect, it } from 'vitest';
import { DEFAULT_SETTINGS } from '@/lib/brood/settings';
import { developmentClock } from '@/lib/brood/temperature/development-clock';
import type { DailyExtremes, LoggerReading } from '@/lib/brood/temperature/record';
import { temperatureSettings } from '@/lib/brood/temperature/temperature-settings';

const HOUR = 3_600_000;
const START = Date.parse('2026-06-01T04:00:00Z');
const NEST = { zone: 'America/New_York', place: { lat: 40, lon: -75 } };
const SETTINGS = temperatureSettings(DEFAULT_SETTINGS.values, 25);

/** Readings every `step` hours. */
function logger(celsius: readonly number[], step = 1): LoggerReading[] {
  return celsius.map((value, i) => ({ at: START + i * step * HOUR, celsius: value }));
}

const clockOf = (readings: readonly LoggerReading[]) => developmentClock({ kind: 'logger', readings }, SETTINGS, NEST);
const dailyClock = (days: readonly DailyExtremes[]) => developmentClock({ kind: 'daily', days }, SETTINGS, NEST);

/** Days of the durations that a clock counts between two instants. */
function daysCounted({ rates }: { rates: readonly (readonly [number, number])[] }, from: number, to: number): number {
  let sum = 0;
  for (let hour = from; hour < to; hour += HOUR) sum += (rates.findLast(([since]) => since <= hour)?.[1] ?? 1) / 24;
  return sum;
}

describe('the development clock of a logger', () => {
  it('counts a day at 25 °C as one day and a day at 17.5 °C as half of one', () => {
    expect(clockOf(logger(Array<number>(25).fill(25))).rates).toEqual([]);
    expect(daysCounted(clockOf(logger(Array<number>(25).fill(17.5))), START, START + 24 * HOUR)).toBeCloseTo(0.5, 12);
  });

  it('sums the rate of each moment: half a day at 5 and half at 45 °C makes nothing, though the mean is 25', () => {
    const readings = logger([...Array<number>(12).fill(5), ...Array<number>(13).fill(45)]);
    // Only the hour of the change crosses temperatures at which brood develops.
    expect(daysCounted(clockOf(readings), START, START + 24 * HOUR)).toBeLessThan(0.05);
  });

  it('goes back to calendar days where the record ends', () => {
    const { rates, from, to } = clockOf(logger([20, 20, 20]));
    expect(rates).toEqual([
      [START, expect.closeTo(2 / 3, 12)],
      [START + 2 * HOUR, 1],
    ]);
    expect([from, to]).toEqual([START, START + 2 * HOUR]);
  });

  it('draws a short gap and says so', () => {
    const readings = [
      ...logger([15, 15]),
      { at: START + 4 * HOUR, celsius: 21 },
      { at: START + 5 * HOUR, celsius: 21 },
    ];
    const clock = clockOf(readings);
    expect(clock.filled).toEqual([{ from: START + HOUR, to: START + 4 * HOUR, how: 'interpolated' }]);
    // The middle of the gap, 18 °C: (18 - 10) / 15.
    expect(clock.rates.find(([at]) => at === START + 2 * HOUR)?.[1]).toBeCloseTo(8 / 15, 12);
    expect(clock.warnings).toEqual([]);
  });

  it('counts calendar days in a long gap, with the gap named in the nest’s own time', () => {
    const clock = clockOf([
      ...logger([15, 15]),
      { at: START + 49 * HOUR, celsius: 15 },
      { at: START + 50 * HOUR, celsius: 15 },
    ]);
    expect(clock.filled).toEqual([{ from: START + HOUR, to: START + 49 * HOUR, how: 'calendar' }]);
    expect(daysCounted(clock, START + HOUR, START + 49 * HOUR)).toBeCloseTo(2, 12);
    expect(clock.warnings).toEqual([
      {
        code: 'long-gap',
        text: 'Nothing was measured from 2026-06-01 01:00 to 2026-06-03 01:00: calendar days are counted.',
      },
    ]);
  });

  it('warns of heat once for each stretch above 42 °C, with its highest value', () => {
    const { warnings } = clockOf(logger([41, 43, 44.2, 41, 42, 42.5, 30]));
    expect(warnings.map(({ code }) => code)).toEqual(['heat', 'heat']);
    expect(warnings[0]?.text).toContain('from 2026-06-01 01:00 to 2026-06-01 02:00 (highest 44.2 °C)');
    expect(warnings[1]?.text).toContain('at 2026-06-01 05:00 (highest 42.5 °C)');
  });

  it('says when readings are too far apart to show the heat of the day', () => {
    expect(clockOf(logger([20, 25, 20, 25], 6)).warnings.map(({ code }) => code)).toEqual(['sparse']);
  });

  it('is calendar days without a record and with an empty one', () => {
    const none = { kind: 'none', from: null, to: null, rates: [], filled: [], warnings: [] };
    expect(developmentClock(null, SETTINGS, NEST)).toEqual(none);
    expect(clockOf([])).toEqual(none);
  });
});

describe('the development clock of daily extremes', () => {
  const june = (day: number, min = 15, max = 27): DailyExtremes => ({
    date: `2026-06-${String(day).padStart(2, '0')}`,
    min,
    max,
  });

  it('covers whole local days and counts calendar days around them', () => {
    const clock = dailyClock([june(1), june(2)]);
    expect([clock.from, clock.to]).toEqual([START, START + 48 * HOUR]);
    expect(clock.rates.at(-1)).toEqual([START + 48 * HOUR, 1]);
    // Between all minimum (1/3) and all maximum (17/15).
    const counted = daysCounted(clock, START, START + 48 * HOUR);
    expect(counted).toBeGreaterThan(2 / 3);
    expect(counted).toBeLessThan(34 / 15);
  });

  it('counts 23 hours on the day the clocks go forward', () => {
    const clock = dailyClock([{ date: '2026-03-08', min: 25, max: 25.000001 }]);
    expect((clock.to ?? 0) - (clock.from ?? 0)).toBe(23 * HOUR);
  });

  it('is warmest in the afternoon and coldest about sunrise, in the nest’s own time', () => {
    const { rates } = dailyClock([june(1), june(2), june(3)]);
    const day = rates.filter(([at]) => at >= START + 24 * HOUR && at < START + 48 * HOUR);
    const hourOf = (pick: (rates: number[]) => number) => {
      const value = pick(day.map(([, rate]) => rate));
      return ((day.find(([, rate]) => rate === value)?.[0] ?? 0) - START - 24 * HOUR) / HOUR;
    };
    // On 2 June at 40° N, 75° W the sun is up from 05:34 to 20:24; the maximum of the curve lies 9.4 h after sunrise.
    expect([5, 6]).toContain(hourOf((all) => Math.min(...all)));
    expect([14, 15]).toContain(hourOf((all) => Math.max(...all)));
  });

  it('draws one missing day and leaves two missing ones to the calendar', () => {
    const one = dailyClock([june(1), june(3)]);
    expect(one.filled).toEqual([{ from: START + 24 * HOUR, to: START + 48 * HOUR, how: 'interpolated' }]);
    const two = dailyClock([june(1), june(4)]);
    expect(two.filled).toEqual([{ from: START + 24 * HOUR, to: START + 72 * HOUR, how: 'calendar' }]);
    expect(daysCounted(two, START + 24 * HOUR, START + 72 * HOUR)).toBeCloseTo(2, 12);
    expect(two.warnings.map(({ code }) => code)).toEqual(['long-gap']);
  });

  it('warns of a day above 42 °C and of a nest without a place', () => {
    const clock = developmentClock({ kind: 'daily', days: [june(1, 20, 43)] }, SETTINGS, { ...NEST, place: null });
    expect(clock.warnings.map(({ code }) => code)).toEqual(['heat', 'no-place']);
  });

  it('ends another night by the other curve when the settings say so', () => {
    const settings = { ...SETTINGS, curve: 'parton-logan' as const };
    const other = developmentClock({ kind: 'daily', days: [june(1)] }, settings, NEST);
    expect(other.rates).not.toEqual(dailyClock([june(1)]).rates);
  });
});
