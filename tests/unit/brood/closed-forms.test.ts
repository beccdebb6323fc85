import { describe, expect, it } from 'vitest';
import facts from '@/tests/fixtures/brood/duration-facts.json';
import { enteredWithin, massesAt, meanOf, reachedBy } from './stage-rows';

/** P(a stage of k phases lasts at most x). */
function erlangCdf(phases: number, meanDays: number, x: number): number {
  return massesAt([{ phases, meanDays }], x)[phases] ?? NaN;
}

/** P(the stage a sighting fell into lasts at most x days more). */
function residualCdf(phases: number, meanDays: number, x: number): number {
  return reachedBy([{ phases, meanDays }], [0, phases], x);
}

describe('Erlang stages (closed forms, Poisson sums; duration-facts.json, scipy 1.17.1)', () => {
  it('gives the Erlang CDF of 4 phases, mean 8, at 6 (B01, Poisson-sum identity)', () => {
    expect(Math.abs(erlangCdf(4, 8, 6) - 0.35276811121776874)).toBeLessThan(1e-14);
  });

  it('gives 1 − 2/e for 2 phases, mean 2, at 1 (B02, closed form)', () => {
    expect(Math.abs(erlangCdf(2, 2, 1) - (1 - 2 / Math.E))).toBeLessThan(1e-15);
  });

  it.each(facts.erlang_cdf)('agrees for $k phases, mean $mean, at $x', ({ k, mean, x, cdf }) => {
    expect(Math.abs(erlangCdf(k, mean, x) - cdf)).toBeLessThan(1e-12);
  });
});

describe('one sighting with a flat prior (equilibrium law of renewal theory, Cox 1962)', () => {
  it('expects 5.2 more days of a stage of 25 phases and 10 days, not 5 (B03)', () => {
    expect(Math.abs(meanOf((x) => residualCdf(25, 10, x), 40) - 5.2)).toBeLessThan(1e-12);
  });

  it('gives 0.499960273470958 for at most 5 of those days (B04)', () => {
    expect(Math.abs(residualCdf(25, 10, 5) - 0.499960273470958)).toBeLessThan(1e-12);
  });

  it('gives 0.6487490129845832 for 9 phases, mean 12, at most 8 days (B05)', () => {
    expect(Math.abs(residualCdf(9, 12, 8) - 0.6487490129845832)).toBeLessThan(1e-12);
  });

  it.each(facts.one_sighting_flat_prior_residual)(
    'agrees for $k phases and mean $mean',
    ({ k, mean, mean_residual, cdf }) => {
      expect(Math.abs(meanOf((x) => residualCdf(k, mean, x), 35 * mean) - mean_residual)).toBeLessThan(1e-9);
      for (const [x, p] of Object.entries(cdf))
        expect(Math.abs(residualCdf(k, mean, Number(x)) - p)).toBeLessThan(1e-12);
    },
  );

  it.each(facts.one_sighting_flat_prior_residual)(
    'gives the time already spent the same law ($k phases)',
    ({ k, mean, cdf }) => {
      for (const [x, p] of Object.entries(cdf)) {
        const spent = enteredWithin([{ phases: k, meanDays: mean }], [0, k], Number(x));
        expect(Math.abs(spent - p)).toBeLessThan(1e-12);
      }
    },
  );
});

describe('stage at a given age (matrix exponential, scipy 1.17.1)', () => {
  const { chain: stages, rows } = facts.stage_occupancy_given_age;
  const shapes = stages.map(([, phases, meanDays]) => ({ phases: Number(phases), meanDays: Number(meanDays) }));

  /** Probabilities of the stages and of being out. */
  function stagesAt(age: number): number[] {
    const masses = massesAt(shapes, age);
    const starts = shapes.reduce<number[]>((all, { phases }) => [...all, (all.at(-1) ?? 0) + phases], [0]);
    return starts.map((start, i) =>
      masses.subarray(start, starts[i + 1] ?? masses.length).reduce((sum, p) => sum + p, 0),
    );
  }

  it('gives larva, pupa, emerged at 30 days (B06)', () => {
    const [, larva, pupa, emerged] = stagesAt(30);
    expect(larva).toBeCloseTo(0.563687328, 9);
    expect(pupa).toBeCloseTo(0.429997247, 9);
    expect(emerged).toBeCloseTo(0.00590101, 9);
  });

  it.each(rows)('agrees at $age days', ({ age, egg, larva, pupa, emerged }) => {
    const got = stagesAt(age);
    [egg, larva, pupa, emerged].forEach((p, stage) => expect(Math.abs((got[stage] ?? NaN) - p)).toBeLessThan(1e-12));
  });
});
