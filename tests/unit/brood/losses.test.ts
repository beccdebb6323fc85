import { describe, expect, it } from 'vitest';
import { nestModel } from '@/lib/brood/class-law';
import { GENUS_ROW } from '@/lib/brood/durations';
import { lossTotal, lossesByNode } from '@/lib/brood/losses';
import { settingsWith } from './support';

const PUPA = { key: 'capped', first: 6, last: 6 };
const EGG = { key: 'egg', first: 0, last: 0 };

describe('losses before an adult comes out', () => {
  it('is 1 − E[exp(−μ T)] of the remaining Erlang time (Laplace transform of the equilibrium law)', () => {
    const settings = settingsWith({ lossCapped: 0.05 });
    const { chain } = nestModel(GENUS_ROW, settings);
    const [losses] = lossesByNode(chain, settings, { group: PUPA, nodes: [{ rate: 1, weight: 1 }] });
    const [k, rate] = [39, 39 / 14];
    const survive = Array.from({ length: k }, (_, left) => (rate / (rate + 0.05)) ** (left + 1) / k).reduce(
      (a, b) => a + b,
    );
    expect(losses?.capped).toBeCloseTo(1 - survive, 12);
    expect(losses).toMatchObject({ egg: 0, larva: 0 });
  });

  it('is smaller in a nest that develops faster', () => {
    const settings = settingsWith({});
    const { chain } = nestModel(GENUS_ROW, settings);
    const nodes = [0.5, 1, 2].map((rate) => ({ rate, weight: 1 }));
    const totals = lossesByNode(chain, settings, { group: EGG, nodes }).map(lossTotal);
    expect(totals).toEqual([...totals].sort((a, b) => b - a));
  });

  it('loses about one egg in eighteen before hatching, at 0.01 a day over 5.6 days', () => {
    const settings = settingsWith({ lossLarva: 0, lossCapped: 0, nestFactorCv: 0 });
    const { chain, nodes } = nestModel(GENUS_ROW, settings);
    const [losses] = lossesByNode(chain, settings, { group: EGG, nodes });
    expect(losses?.egg).toBeGreaterThan(0.05);
    expect(losses?.egg).toBeLessThan(0.06);
  });
});
