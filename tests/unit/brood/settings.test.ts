import { describe, expect, it } from 'vitest';
import { DEFAULT_SETTINGS, SETTING_RULES } from '@/lib/brood/settings';
import { GENUS_ROW } from '@/lib/brood/durations';
import { fitsInstar, phasesFor, stageGroup, stageLaws } from '@/lib/brood/stages';

describe('the default settings', () => {
  it('give every number a value within its bounds, a trust word and a source', () => {
    for (const [name, { min, max }] of Object.entries(SETTING_RULES)) {
      const setting = Object.entries(DEFAULT_SETTINGS.values).find(([key]) => key === name)?.[1];
      expect(setting?.value).toBeGreaterThanOrEqual(min);
      expect(setting?.value).toBeLessThanOrEqual(max);
      expect(setting?.source.length).toBeGreaterThan(10);
      expect(setting?.trust).toBe('assumption');
    }
  });

  it('split 20 larval days into four instars of 3.333 and one of 6.667 (assumption), with 39, 6 and 39 phases', () => {
    const laws = stageLaws(GENUS_ROW, DEFAULT_SETTINGS);
    expect(laws.map(({ phases }) => phases)).toEqual([39, 6, 6, 6, 6, 6, 39]);
    [11, 10 / 3, 10 / 3, 10 / 3, 10 / 3, 20 / 3, 14].forEach((days, i) =>
      expect(laws[i]?.meanDays).toBeCloseTo(days, 12),
    );
  });

  it('make the whole larva vary by 0.192 and the whole development by 4.79 days (arithmetic of the defaults)', () => {
    const laws = stageLaws(GENUS_ROW, DEFAULT_SETTINGS);
    const variance = (from: number, to: number) =>
      laws.slice(from, to).reduce((sum, { phases, meanDays }) => sum + (meanDays * meanDays) / phases, 0);
    expect(Math.sqrt(variance(1, 6)) / 20).toBeCloseTo(0.192, 3);
    expect(Math.sqrt(variance(0, 7))).toBeCloseTo(4.79, 2);
  });

  it('rounds phases and keeps at least one', () => {
    expect([phasesFor(0.16), phasesFor(0.42), phasesFor(1), phasesFor(0.05)]).toEqual([39, 6, 1, 400]);
  });
});

describe('what a recorded class means', () => {
  it.each([
    ['egg', 0, 0],
    ['small', 1, 3],
    ['medium', 4, 4],
    ['large', 5, 5],
    ['capped', 6, 6],
  ] as const)('%s is stages %d to %d', (state, first, last) => {
    expect(stageGroup({ state })).toMatchObject({ first, last });
  });

  it('is no living brood for the other states', () => {
    for (const state of ['unread', 'empty', 'opened', 'dead', 'parasitised', 'webbed', 'damaged'] as const) {
      expect(stageGroup({ state })).toBeNull();
    }
  });

  it('narrows to an instar within the class only', () => {
    expect(stageGroup({ state: 'small', instar: 3 })).toEqual({ key: 'L3', first: 3, last: 3 });
    expect(stageGroup({ state: 'egg', instar: 3 })).toMatchObject({ key: 'egg' });
    expect([fitsInstar({ state: 'large', instar: 5 }), fitsInstar({ state: 'capped', instar: 5 })]).toEqual([
      true,
      false,
    ]);
    expect([fitsInstar({ state: 'egg', instar: 1 }), fitsInstar({ state: 'egg', instar: null })]).toEqual([
      false,
      true,
    ]);
  });
});
