import { describe, expect, it } from 'vitest';
import facts from '@/tests/fixtures/brood/duration-facts.json';
import { crps } from './crps';
import { massesAt } from './stage-rows';

/** The standard normal CDF by Simpson’s rule. */
function normalCdf(x: number): number {
  const steps = 4_000;
  const h = x / steps;
  const density = (t: number) => Math.exp((-t * t) / 2) / Math.sqrt(2 * Math.PI);
  let sum = density(0) + density(x);
  for (let i = 1; i < steps; i++) sum += (i % 2 === 0 ? 2 : 4) * density(i * h);
  return 0.5 + (sum * h) / 3;
}

/** CDF of 9 phases with mean 12, as the product works it out. */
function erlang9(x: number): number {
  return massesAt([{ phases: 9, meanDays: 12 }], x)[9] ?? NaN;
}

const LAWS: Record<string, { cdf: (x: number) => number; from: number; to: number }> = {
  'Normal(0,1)': { cdf: normalCdf, from: -9, to: 9 },
  'Exponential(1)': { cdf: (x) => (x <= 0 ? 0 : 1 - Math.exp(-x)), from: 0, to: 40 },
  'Uniform(0,1)': { cdf: (x) => Math.min(1, Math.max(0, x)), from: 0, to: 1 },
  'Logistic(0,1)': { cdf: (x) => 1 / (1 + Math.exp(-x)), from: -45, to: 45 },
  'Gamma(shape 9, mean 12)': { cdf: erlang9, from: 0, to: 80 },
  'two-point 0 (p=.25), 1 (p=.75)': { cdf: (x) => (x < 1 ? 0.25 : 1), from: 0, to: 1 },
};

describe('the score that forecasts are judged by (CRPS, Gneiting & Raftery 2007, closed forms)', () => {
  it.each(facts.crps)('$forecast at $y', ({ forecast, y, crps: expected }) => {
    const law = LAWS[forecast];
    if (!law) throw new Error(`no law for ${forecast}`);
    expect(Math.abs(crps(law, y) - expected)).toBeLessThan(1e-9);
  });
});
