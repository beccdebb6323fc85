import { describe, expect, it } from 'vitest';
import { type StageLook, type StageSeen, broodSpans } from '@/lib/brood/learning/brood-spans';
import { learnDurations } from '@/lib/brood/learning/duration-learning';
import { seededRandom } from '@/lib/kit/random';

const looks = (...pairs: [number, StageSeen][]): StageLook[] => pairs.map(([day, seen]) => ({ day, seen }));

describe('whole stages enclosed by looks into a cell', () => {
  it('run from the middle of one interval to the middle of another', () => {
    expect(broodSpans(looks([0, 'none'], [2, 'egg'], [10, 'egg'], [14, 'larva']))).toEqual([
      { stages: ['egg'], days: 11, widths: [2, 4] },
    ]);
  });

  it('take all stages of one brood together', () => {
    const [span] = broodSpans(
      looks([0, 'egg'], [2, 'larva'], [20, 'larva'], [22, 'capped'], [34, 'capped'], [36, 'out']),
    );
    expect(span).toEqual({ stages: ['larva', 'capped'], days: 34, widths: [2, 2] });
  });

  it('are not made from a brood that jumped over a stage, was lost, or was seen at one end only', () => {
    expect(broodSpans(looks([0, 'none'], [2, 'egg'], [30, 'capped'], [40, 'out']))).toEqual([]);
    expect(broodSpans(looks([0, 'none'], [2, 'egg'], [5, 'none'], [8, 'egg'], [9, 'egg']))).toEqual([]);
    expect(broodSpans(looks([0, 'egg'], [5, 'larva']))).toEqual([]);
    expect(broodSpans([])).toEqual([]);
  });
});

const PRIOR = {
  expectation: { mean: { egg: 11, larva: 20, capped: 14 }, cv: { egg: 0.16, larva: 0.192, capped: 0.16 } },
  sd: 0.25,
  betweenNests: Math.sqrt(Math.log(1.04)),
};

describe('the factor on the durations of a taxon', () => {
  it('is the closed form of normal laws on the log scale, worked by hand for one brood', () => {
    const learned = learnDurations([{ spans: [{ stages: ['larva'], days: 25, widths: [2, 3] }] }], PRIOR);
    // m = ln(25/20); v = ((4 + 9)/12 + (0.192·20)²)/20² + ln 1.04; prior precision 16.
    const m = Math.log(1.25);
    const v = (13 / 12 + 3.84 ** 2) / 400 + Math.log(1.04);
    const precision = 16 + 1 / v;
    expect(learned?.posterior.median).toBeCloseTo(Math.exp(m / v / precision), 12);
    expect(learned?.posterior.p95[1]).toBeCloseTo(
      Math.exp(m / v / precision + 1.959963984540054 / Math.sqrt(precision)),
      12,
    );
    expect(learned?.logRate.mean).toBeCloseTo(-m / v / precision, 12);
    expect(learned?.logRate.sd).toBeCloseTo(Math.sqrt(1 / precision + Math.log(1.04)), 12);
    expect(learned).toMatchObject({ nests: 1, broods: 1, prior: { median: 1 } });
  });

  it('counts ten broods of one nest for less than ten nests', () => {
    const span = { stages: ['larva' as const], days: 26, widths: [1, 1] as [number, number] };
    const one = learnDurations([{ spans: Array(10).fill(span) }], PRIOR);
    const ten = learnDurations(Array(10).fill({ spans: [span] }), PRIOR);
    expect(one?.posterior.median).toBeLessThan(ten?.posterior.median ?? 0);
    expect(one).toMatchObject({ nests: 1, broods: 10 });
    expect(ten).toMatchObject({ nests: 10, broods: 10 });
  });

  it('leaves out broods whose ends are hardly known, and is null without any', () => {
    expect(learnDurations([{ spans: [{ stages: ['egg'], days: 11, widths: [6, 1] }] }], PRIOR)).toBeNull();
    expect(learnDurations([], PRIOR)).toBeNull();
  });

  it('finds the factor that simulated nests were made with, 1.3, within its range (seed 5)', () => {
    const random = seededRandom(5);
    const gauss = () => Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
    const nests = Array.from({ length: 40 }, () => {
      const nest = 1.3 * Math.exp(PRIOR.betweenNests * gauss());
      const brood = () => ({
        stages: ['larva' as const],
        days: 20 * nest * Math.exp(0.192 * gauss()) + (random() - random()),
        widths: [2, 2] as [number, number],
      });
      return { spans: Array.from({ length: 6 }, brood) };
    });
    const learned = learnDurations(nests, PRIOR);
    expect(learned?.posterior.p95[0]).toBeLessThan(1.3);
    expect(learned?.posterior.p95[1]).toBeGreaterThan(1.3);
    expect((learned?.posterior.p95[1] ?? 9) - (learned?.posterior.p95[0] ?? 0)).toBeLessThan(0.25);
  });
});
