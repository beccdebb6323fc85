import { describe, expect, it } from 'vitest';
import { ConfusionError, checkConfusion, likelihoodOf } from '@/lib/brood/hmm/emission';

const confusion = { empty: { empty: 0.9, egg: 0.1 }, egg: { egg: 0.8, empty: 0.2 } };

describe('what a record says of each state', () => {
  it('is the entry of its class, a sum for a set, nothing for not looked at', () => {
    expect(likelihoodOf('egg', confusion, ['empty', 'egg', 'egg'])).toEqual(Float64Array.of(0.1, 0.8, 0.8));
    expect(likelihoodOf(['egg', 'empty'], confusion, ['empty', 'egg'])).toEqual(Float64Array.of(1, 1));
    expect(likelihoodOf(null, confusion, ['empty', 'egg'])).toBeNull();
  });
});

describe('a confusion matrix is refused with the row named', () => {
  it.each([
    ['egg', { ...confusion, egg: { egg: 0.8, empty: 0.1 } }, 'sums to 0.9'],
    ['egg', { empty: confusion.empty }, 'is missing'],
    ['empty', { ...confusion, empty: { empty: 1.1, egg: -0.1 } }, 'outside 0 to 1'],
    ['empty', { ...confusion, empty: { empty: NaN } }, 'outside 0 to 1'],
  ])('row %s', (row, matrix, problem) => {
    const check = () => checkConfusion(matrix, ['empty', 'egg']);
    expect(check).toThrow(ConfusionError);
    expect(check).toThrow(`row ${row}: `);
    expect(check).toThrow(problem);
  });
});
