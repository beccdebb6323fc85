import { describe, expect, it } from 'vitest';
import { dayScale, dayTicks, isOn, percentOf } from '@/components/charts/day-scale';
import { niceTop } from '@/components/charts/value-scale';
import { daysBetween } from '@/lib/kit/local-date';

describe('a scale of days', () => {
  it('holds its dates with room at both ends', () => {
    expect(dayScale(['2026-06-10', '2026-05-10'], 3)).toEqual({ from: '2026-05-07', to: '2026-06-13', days: 37 });
  });

  it('has no length without dates, and some with one', () => {
    expect(dayScale([])).toBeNull();
    expect(dayScale(['2026-06-10'], 0)?.days).toBe(1);
  });

  it('puts the ends at 0 and 100 percent and the middle at 50', () => {
    const scale = { from: '2026-06-01', to: '2026-06-21', days: 20 };
    expect(percentOf(scale, '2026-06-01')).toBe(0);
    expect(percentOf(scale, '2026-06-11')).toBe(50);
    expect(percentOf(scale, '2026-06-21')).toBe(100);
  });

  it('counts days, not hours, across the change of the clocks', () => {
    const scale = { from: '2026-03-01', to: '2026-03-11', days: 10 };
    expect(percentOf(scale, '2026-03-09') - percentOf(scale, '2026-03-08')).toBeCloseTo(10, 9);
  });

  it('knows which dates lie on it', () => {
    const scale = { from: '2026-06-01', to: '2026-06-21', days: 20 };
    expect(isOn(scale, '2026-06-21')).toBe(true);
    expect(isOn(scale, '2026-12-01')).toBe(false);
  });

  it('labels at most as many days as asked, evenly, away from both edges', () => {
    for (const days of [5, 30, 90, 200]) {
      const scale = { from: '2026-04-01', to: 'later', days };
      const ticks = dayTicks(scale, 4);
      expect(ticks.length).toBeGreaterThan(0);
      expect(ticks.length).toBeLessThanOrEqual(4);
      const gaps = new Set(ticks.slice(1).map((tick, index) => daysBetween(ticks[index] ?? '', tick)));
      expect(gaps.size).toBeLessThanOrEqual(1);
      for (const tick of ticks) expect(Math.abs(percentOf(scale, tick) - 50)).toBeLessThanOrEqual(44.5);
    }
  });
});

describe('the top of a value axis', () => {
  it('is 1, 2 or 5 times a power of ten, never below 1', () => {
    expect([0, 0.2, 1, 1.1, 2, 3, 5, 7, 11, 60].map(niceTop)).toEqual([1, 1, 1, 2, 2, 5, 5, 10, 20, 100]);
  });
});
