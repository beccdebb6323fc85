import { describe, expect, it } from 'vitest';
import vectors from '@/tests/fixtures/brood/brood-hmm.json';
import { answerHistories } from '@/lib/brood/answer-histories';
import { parseHistoriesFile } from '@/lib/brood/histories-file';

const PROBABILITY = vectors.tolerance.probability;
const QUANTILE = vectors.tolerance.quantile_days;

/** The batch door's answer to one record under the model of the vectors. */
function answer(times: readonly number[], obs: readonly unknown[], rest: object = {}) {
  const file = parseHistoriesFile(
    JSON.stringify({ model: vectors.model, histories: [{ name: 'case', times, obs }], ...rest }),
  );
  if (!file.ok) throw new Error(file.error);
  const [row] = answerHistories(file.value).histories;
  if (!row) throw new Error('no answer');
  return row;
}

/** The largest difference between two lists or two sets of named numbers. */
function gap(a: object | null | undefined, b: object | null | undefined): number {
  const [left, right] = [Object.entries(a ?? {}), new Map(Object.entries(b ?? {}))];
  expect(left.length).toBe(right.size);
  return Math.max(...left.map(([key, value]) => Math.abs(Number(value) - Number(right.get(key)))));
}

describe('record histories of brood-hmm.json (dense matrix exponential, scipy 1.17.1)', () => {
  it.each(vectors.cases)('$name agrees in likelihood and states to 1e-8', (expected) => {
    const got = answer(expected.times, expected.obs);
    expect(Math.abs((got.loglik ?? NaN) - expected.loglik)).toBeLessThan(vectors.tolerance.loglik);
    expected.filtered.forEach((mass, i) => expect(gap(got.filtered?.[i], mass)).toBeLessThan(PROBABILITY));
    expected.smoothed.forEach((mass, i) => expect(gap(got.smoothed?.[i], mass)).toBeLessThan(PROBABILITY));
    expect(Object.keys(got.filtered?.[0] ?? {})).toEqual(Object.keys(expected.filtered[0] ?? {}));
  });

  it.each(vectors.cases)('$name agrees in laying laws to 1e-8 and in their quantiles to 1e-6 days', (expected) => {
    const got = answer(expected.times, expected.obs, { grid: expected.grid });
    expect(gap(got.laid_gen1, expected.laid_gen1)).toBeLessThan(PROBABILITY);
    expect(gap(got.laid_current, expected.laid_current)).toBeLessThan(PROBABILITY);
    expect(gap(got.laid_gen1_quantiles, expected.laid_gen1_quantiles)).toBeLessThan(QUANTILE);
    expect(gap(got.laid_current_quantiles, expected.laid_current_quantiles)).toBeLessThan(QUANTILE);
  });

  it.each(vectors.cases)('$name agrees in the present brood and its forecast to 1e-8', (expected) => {
    const got = answer(expected.times, expected.obs);
    const weights = expected.generation_weights_given_occupied;
    expect(Math.abs((got.p_occupied_at_last_census ?? NaN) - expected.p_occupied_at_last_census)).toBeLessThan(
      PROBABILITY,
    );
    expect(gap(got.generation_weights_given_occupied, weights)).toBeLessThan(PROBABILITY);
    expect(got.forecast?.days_after_last_census).toEqual(expected.forecast.days_after_last_census);
    expect(gap(got.forecast?.capped, expected.forecast.capped)).toBeLessThan(PROBABILITY);
    expect(gap(got.forecast?.emerged, expected.forecast.emerged)).toBeLessThan(PROBABILITY);
    expect(gap(got.forecast?.removed, expected.forecast.removed)).toBeLessThan(PROBABILITY);
  });
});

describe('further check values under the same model (methods table; scipy, Monte Carlo and a prototype agree)', () => {
  const weekly = answer([10, 17, 24, 31, 38, 45, 52], ['absent', 'egg', 'egg', 'L2', 'L4', 'pupa', 'pupa'], {
    forecastDays: [7, 14],
  });

  it('B08: a single L4 at day 40 has log-likelihood −2.350496', () => {
    expect(answer([40], ['L4']).loglik).toBeCloseTo(-2.350496, 6);
  });

  it('B09: the weekly series has log-likelihood −5.521903, median laying 14.523, 95 % 10.891–16.924', () => {
    expect(weekly.loglik).toBeCloseTo(-5.521903, 6);
    const { '0.025': low = NaN, '0.5': median = NaN, '0.975': high = NaN } = weekly.laid_gen1_quantiles ?? {};
    expect(Math.abs(median - 14.523)).toBeLessThan(0.001);
    expect(Math.abs(low - 10.891)).toBeLessThan(0.001);
    expect(Math.abs(high - 16.924)).toBeLessThan(0.001);
  });

  it('B11: its brood has emerged with 0.441651 and 0.859380 after 7 and 14 days, is lost with 0.072584', () => {
    expect(weekly.forecast?.emerged[0]).toBeCloseTo(0.441651, 6);
    expect(weekly.forecast?.emerged[1]).toBeCloseTo(0.85938, 6);
    expect(weekly.forecast?.removed[1]).toBeCloseTo(0.072584, 6);
  });
});

describe('records of special kinds', () => {
  it('takes a visit that did not look in as nothing (1e-10)', () => {
    const [plain, withNull] = [answer([12, 26], ['egg', 'L3']), answer([12, 19.3, 26], ['egg', null, 'L3'])];
    expect(Math.abs((plain.loglik ?? NaN) - (withNull.loglik ?? NaN))).toBeLessThan(1e-10);
    expect(gap(plain.smoothed?.[1], withNull.smoothed?.[2])).toBeLessThan(1e-10);
    expect(gap(plain.forecast?.emerged, withNull.forecast?.emerged)).toBeLessThan(1e-10);
  });

  it('takes the set of all classes as nothing, and a class named twice as once', () => {
    const all = ['absent', 'empty', ...vectors.model.stages];
    expect(answer([12, 26], ['egg', all]).loglik).toBeCloseTo(answer([12, 26], ['egg', null]).loglik ?? NaN, 12);
    expect(answer([12], [['egg', 'egg']]).loglik).toBeCloseTo(answer([12], ['egg']).loglik ?? NaN, 12);
  });

  it('gives a set of classes the sum of their likelihoods', () => {
    const [egg, empty] = [answer([20], ['egg']).loglik ?? NaN, answer([20], ['empty']).loglik ?? NaN];
    expect(answer([20], [['egg', 'empty']]).loglik).toBeCloseTo(Math.log(Math.exp(egg) + Math.exp(empty)), 12);
  });

  it('only sharpens when the same class is recorded twice at one moment', () => {
    const [once, twice] = [answer([40], ['L4']), answer([40, 40], ['L4', 'L4'])];
    expect(twice.smoothed?.[1]?.['L4#1']).toBeGreaterThan(once.smoothed?.[0]?.['L4#1'] ?? 1);
    expect(gap(twice.smoothed?.[0], twice.smoothed?.[1])).toBeLessThan(1e-14);
  });

  it('has no present brood in a cell that is not built', () => {
    const row = answer([10], ['absent']);
    expect(row).toMatchObject({ p_occupied_at_last_census: 0, laid_current_quantiles: null, forecast: null });
    expect(row.generation_weights_given_occupied).toBeNull();
    expect(row.laid_gen1_quantiles?.['0.5']).toBe(10);
  });

  it('answers with nulls what the model cannot produce', () => {
    const row = answer([10, 17], ['egg', 'absent']);
    expect(row).toMatchObject({ loglik: null, filtered: null, smoothed: null, forecast: null });
  });

  it('works equal records out alike under their own names', () => {
    const histories = ['a', 'b'].map((name) => ({ name, times: [20], obs: ['egg'] }));
    const file = parseHistoriesFile(JSON.stringify({ model: vectors.model, histories }));
    const rows = file.ok ? answerHistories(file.value).histories : [];
    expect(rows.map(({ name }) => name)).toEqual(['a', 'b']);
    expect({ ...rows[0], name: '' }).toEqual({ ...rows[1], name: '' });
  });
});
