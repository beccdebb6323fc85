import { describe, expect, it } from 'vitest';
import { estimateNest } from '@/lib/brood/estimate-nest';
import { layingDifference, nestDates } from '@/lib/brood/laying-difference';
import type { CellState } from '@/lib/comb/states';

const AT = Date.parse('2026-06-16T09:35:00Z');

function estimate(states: readonly CellState[]) {
  const marks = states.map((state, q) => ({ q, r: 0, state }));
  const base = { nest: 'n', zone: 'America/New_York', asOf: AT, taxon: 'Polistes fuscatus' };
  return estimateNest({ ...base, readings: [{ id: 'r', at: AT, marks }] });
}

describe('two readings compared in time', () => {
  it('lie no day apart where they read alike', () => {
    const all = estimate(Array.from({ length: 40 }, () => 'egg'));
    expect(layingDifference(all, all)).toMatchObject({ cells: 40, medianDays: 0, largestDays: 0 });
  });

  it('lie apart by the days between two stages, older first counted negative', () => {
    const [first, second] = [estimate(['capped', 'egg', 'empty']), estimate(['egg', 'egg', 'egg'])];
    const { cells, byCell, medianDays, largestDays } = layingDifference(first, second);
    expect(cells).toBe(2);
    expect(byCell['0,0']).toBeLessThan(-10);
    // Read alike, but the neighbour tells a little about how fast the whole nest is.
    expect(Math.abs(byCell['1,0'] ?? 9)).toBeLessThan(0.1);
    expect(largestDays).toBe(Math.abs(byCell['0,0'] ?? 0));
    expect(medianDays).toBeCloseTo((largestDays ?? 0) / 2, 1);
  });

  it('have no difference where nothing is dated by both', () => {
    expect(layingDifference(estimate(['empty']), estimate(['egg']))).toEqual({
      cells: 0,
      medianDays: null,
      largestDays: null,
      byCell: {},
    });
    expect(nestDates(estimate(['empty']))).toEqual({ founded: null, firstEmergence: null });
  });
});
