import { describe, expect, it } from 'vitest';
import { READING_SCALE } from '@/lib/comb/reading-scale';
import type { CellState } from '@/lib/comb/states';
import { seededRandom } from '@/lib/kit/random';
import { agreementOf } from '@/lib/stats/agreement-of';
import { N12 } from '@/tests/support/n12';

function reading(which: 'field' | 'blind' | 'final') {
  return N12.map((cell) => ({ q: cell.q, r: cell.r, state: cell[which] }));
}

/** A row of cells with these states. */
function rowOf(...states: CellState[]) {
  return states.map((state, q) => ({ q, r: 0, state }));
}

describe('the agreement of two readings', () => {
  it('of N12 is 29 of 33 = 0.8788 and kappa 0.8481 (counted by hand; kappa worked out on paper)', () => {
    const found = agreementOf(reading('field'), reading('blind'), READING_SCALE);
    expect([found.n, found.raw.agreed]).toEqual([33, 29]);
    expect(found.raw.share).toBeCloseTo(0.8788, 4);
    expect(found.kappa.value).toBeCloseTo(0.8481, 4);
    expect(found.differences.map(({ q, r, first, second }) => [q, r, first, second])).toEqual([
      [-1, 0, 'parasitised', 'capped'],
      [0, 2, 'medium', 'large'],
      [-2, 0, 'small', 'medium'],
      [-3, 2, 'empty', 'egg'],
    ]);
    expect(found.leftOut).toEqual({ unread: 0, onlyFirst: 0, onlySecond: 0 });
  });

  it('compares stages only where both words are stages', () => {
    const found = agreementOf(reading('field'), reading('blind'), READING_SCALE);
    expect([found.kappaLinear.n, found.kappaQuadratic.n, found.alphaOrdinal.n]).toEqual([31, 31, 31]);
    expect(found.kappaQuadratic.value).toBeGreaterThan(found.kappa.value ?? 1);
  });

  it('gives every figure an interval around it, the same each time', () => {
    const once = agreementOf(reading('field'), reading('blind'), READING_SCALE);
    expect(agreementOf(reading('field'), reading('blind'), READING_SCALE)).toEqual(once);
    for (const { value, interval } of [once.kappa, once.kappaLinear, once.alphaNominal, once.alphaOrdinal]) {
      expect(interval?.low).toBeLessThan(value ?? NaN);
      expect(interval?.high).toBeGreaterThanOrEqual(value ?? NaN);
    }
    expect(once.kappa.intervalBy).toBe('draws');
  });

  it('leaves out and counts cells unread by either or present in one reading only', () => {
    const first = [...rowOf('egg', 'unread', 'capped', 'unread'), { q: 9, r: 9, state: 'egg' as const }];
    const found = agreementOf(first, rowOf('egg', 'egg', 'unread', 'unread', 'large', 'small'), READING_SCALE);
    expect([found.n, found.leftOut]).toEqual([1, { unread: 3, onlyFirst: 1, onlySecond: 2 }]);
  });

  it('has no kappa when both read one word throughout, and says so', () => {
    const { kappa, alphaNominal, raw } = agreementOf(rowOf('egg', 'egg'), rowOf('egg', 'egg'), READING_SCALE);
    expect(kappa).toEqual({ value: null, interval: null, intervalBy: null, n: 2, missing: 'one-word-only' });
    expect(alphaNominal.missing).toBe('one-word-only');
    expect(raw.share).toBe(1);
  });

  it('has no figure at all when there is nothing to compare', () => {
    const { kappa, raw } = agreementOf(rowOf('unread'), rowOf('egg'), READING_SCALE);
    expect([kappa.missing, raw.share, raw.interval]).toEqual(['nothing-compared', null, { low: 0, high: 1 }]);
  });

  it('claims no certainty from full agreement: the figure is 1, without an interval', () => {
    const cells = rowOf('egg', 'small', 'large', 'capped');
    expect(agreementOf(cells, cells, READING_SCALE).kappa).toMatchObject({ value: 1, interval: null, missing: null });
  });

  it('counts agreement about each word by itself', () => {
    const { classes, table } = agreementOf(reading('field'), reading('blind'), READING_SCALE);
    const capped = classes[table.categories.indexOf('capped')];
    expect(capped).toEqual({ both: 6, first: 6, second: 7, share: 12 / 13 });
  });

  it('takes the variance from 50 cells on, and stays quick on a comb of 500 (seed 7)', () => {
    const random = seededRandom(7);
    const word = () => READING_SCALE.ordered[Math.floor(random() * 5)] ?? 'egg';
    const first = Array.from({ length: 500 }, (_, at) => ({ q: at % 25, r: Math.floor(at / 25), state: word() }));
    const second = first.map((cell) => (random() < 0.8 ? cell : { ...cell, state: word() }));
    const { kappa, n } = agreementOf(first, second, READING_SCALE);
    expect([n, kappa.intervalBy]).toEqual([500, 'variance']);
    expect((kappa.interval?.high ?? 0) - (kappa.interval?.low ?? 0)).toBeLessThan(0.1);
  });
});
