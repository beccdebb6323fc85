import { describe, expect, it } from 'vitest';
import facts from '@/tests/fixtures/brood/duration-facts.json';
import { twoMomentStage } from '@/lib/brood/hmm/stage-fit';

/** Mean and CV of a mixture of Erlang(k − 1) and Erlang(k). */
function moments({ phases, rate, skipFirst }: ReturnType<typeof twoMomentStage>) {
  const mean = (phases - skipFirst) / rate;
  const square = (skipFirst * (phases - 1) * phases + (1 - skipFirst) * phases * (phases + 1)) / (rate * rate);
  return { mean, cv: Math.sqrt(square - mean * mean) / mean };
}

describe('a stage fitted to a mean and a coefficient of variation (Tijms 1994, duration-facts.json)', () => {
  it('B07: mean 12, CV 0.12 needs 70 phases, the first skipped with 0.33386, at rate 5.80551', () => {
    const { phases, rate, skipFirst } = twoMomentStage(12, 0.12);
    expect(phases).toBe(70);
    expect(Math.abs(skipFirst - 0.3338643323863807)).toBeLessThan(1e-10);
    expect(Math.abs(rate - 5.805511305634468)).toBeLessThan(1e-10);
  });

  it.each(facts.two_moment_erlang_mixture)(
    'agrees for mean $mean, CV $cv',
    ({ mean, cv, k, p_skip_first_phase, rate }) => {
      const fit = twoMomentStage(mean, cv);
      expect(fit.phases).toBe(k);
      expect(Math.abs(fit.skipFirst - p_skip_first_phase)).toBeLessThan(1e-10);
      expect(Math.abs(fit.rate - rate)).toBeLessThan(1e-10);
      expect(moments(fit).mean).toBeCloseTo(mean, 12);
      expect(moments(fit).cv).toBeCloseTo(cv, 12);
    },
  );

  it('is one plain phase for a CV of 1 and plain Erlang where 1/CV² is whole', () => {
    expect(twoMomentStage(5, 1)).toEqual({ phases: 1, rate: 0.2, skipFirst: 0 });
    const fit = twoMomentStage(8, 0.5);
    expect(fit.phases).toBe(4);
    expect(fit.skipFirst).toBeCloseTo(0, 12);
  });
});
