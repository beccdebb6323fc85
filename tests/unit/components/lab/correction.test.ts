import { describe, expect, it } from 'vitest';
import { type Correction, reasonTrouble, withCorrection, withoutCorrection } from '@/components/lab/bench/correction';

const correction = (q: number, r: number, reason = 'seen in photo 4'): Correction => ({
  q,
  r,
  was: 'empty',
  state: 'egg',
  reason,
});

describe('the list of corrections', () => {
  it('stays in walk order', () => {
    const list = withCorrection([correction(0, 2), correction(-3, 2)], correction(0, 0));
    expect(list.map(({ q, r }) => [q, r])).toEqual([
      [0, 0],
      [0, 2],
      [-3, 2],
    ]);
  });

  it('holds one decision a cell, the last', () => {
    const list = withCorrection([correction(0, 2, 'first')], correction(0, 2, 'second'));
    expect(list.map(({ reason }) => reason)).toEqual(['second']);
  });

  it('lets one cell go and keeps the rest', () => {
    expect(withoutCorrection([correction(0, 0), correction(1, 0)], { q: 1, r: 0 })).toEqual([correction(0, 0)]);
  });
});

describe('a reason', () => {
  it('must say something', () => {
    expect(reasonTrouble(' \n ')).toMatch(/^Say why/);
    expect(reasonTrouble('shadow')).toBeNull();
  });

  it('may have 10,000 characters, counted as people count them', () => {
    expect(reasonTrouble('𝕩'.repeat(10_000))).toBeNull();
    expect(reasonTrouble('𝕩'.repeat(10_001))).toContain('10001');
  });
});
