import { describe, expect, it } from 'vitest';
import { CELL_CLASSES } from '@/lib/brood/nest-model/confusion';
import { NO_SPREAD, cellsOf, estimate, reading, settingsWith } from './support';

/** Every class recorded as what it is. */
const NO_SLIPS = {
  confusion: {
    rows: Object.fromEntries(Object.entries(CELL_CLASSES).map(([name, { recorded }]) => [name, { [recorded]: 1 }])),
    trust: 'assumption' as const,
    source: 'test',
  },
};

const AT = '2026-06-10T14:00:00Z';

describe('adults to expect per day', () => {
  it('lists 60 local days from the day asked for, none skipped or doubled', () => {
    const { emergencePerDay } = estimate([reading(AT, cellsOf({ egg: 3 }))]).nest;
    expect(emergencePerDay).toHaveLength(60);
    expect(emergencePerDay[0]?.date).toBe('2026-06-10');
    expect(emergencePerDay.at(-1)?.date).toBe('2026-08-08');
    expect(new Set(emergencePerDay.map(({ date }) => date)).size).toBe(60);
  });

  it('adds up to the probability that adults come out', () => {
    const { cells, nest } = estimate([reading(AT, cellsOf({ capped: 4, large: 6 }))]);
    const expected = nest.emergencePerDay.reduce((sum, day) => sum + day.expected, 0);
    const chances = cells.reduce((sum, { emerges }) => sum + (emerges?.probability ?? 0), 0);
    expect(Math.abs(expected - chances)).toBeLessThan(0.15);
  });

  it('spreads capped cells evenly over 14 days when nothing varies (renewal theory)', () => {
    const settings = {
      ...NO_SPREAD,
      ...NO_SLIPS,
      values: { ...NO_SPREAD.values, lossCapped: settingsWith({ lossCapped: 0 }).values.lossCapped },
    };
    const { emergencePerDay } = estimate([reading(AT, cellsOf({ capped: 28 }))], { settings, zone: 'UTC' }).nest;
    for (const { expected } of emergencePerDay.slice(1, 12)) expect(expected).toBeCloseTo(2, 2);
  });

  it('bands a binomial count exactly when nothing is shared: 28 cells, 1/14 a day', () => {
    const settings = {
      ...NO_SPREAD,
      ...NO_SLIPS,
      values: { ...NO_SPREAD.values, lossCapped: settingsWith({ lossCapped: 0 }).values.lossCapped },
    };
    const [, day] = estimate([reading(AT, cellsOf({ capped: 28 }))], { settings, zone: 'UTC' }).nest.emergencePerDay;
    // Binomial(28, 1/14): P(0) = 0.1255, P(≤ 3) = 0.8651, P(≤ 4) = 0.9556 → the 10 % and 90 % points are 0 and 4.
    expect(day).toMatchObject({ lo80: 0, hi80: 4 });
  });

  it('counts nothing for an empty comb', () => {
    const { emergencePerDay } = estimate([reading(AT, cellsOf({ empty: 3 }))]).nest;
    expect(emergencePerDay.every(({ expected, lo80, hi80 }) => expected === 0 && lo80 === 0 && hi80 === 0)).toBe(true);
  });
});
