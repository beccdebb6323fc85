import { describe, expect, it } from 'vitest';
import { countAgreement, settlerOf } from '@/lib/comb/agreement';
import { compareCells } from '@/lib/comb/compare-cells';
import { DEFAULT_REVIEW_SETTINGS, fitsReviewRule } from '@/lib/comb/review-settings';
import { settleSuggestion } from '@/lib/comb/settle-suggestion';
import { isSettlePick } from '@/lib/comb/settle-pick';
import type { CellState } from '@/lib/comb/states';
import { spiral } from '@/lib/comb/walk';
import { n12Marks } from '@/tests/support/n12';

const at = (state: CellState, unsure = false) => ({ q: 0, r: 0, state, unsure });
const withDoubt = (cells: ReturnType<typeof n12Marks>) => cells.map((cell) => ({ ...cell, unsure: false }));
const one = (field: ReturnType<typeof at> | null, lab: ReturnType<typeof at> | null) =>
  compareCells(field ? [field] : [], lab ? [lab] : [])[0];

describe('two readings laid over each other', () => {
  const n12 = compareCells(withDoubt(n12Marks('field')), withDoubt(n12Marks('blind')));

  // The programme's worked reading of N12: 33 cells, raw agreement 29/33 = 0.8788, one clash over a parasitised cell.
  it('of N12 agree on 29 of 33 cells with one clash, and go to the lead biologist', () => {
    const agreement = countAgreement(n12);
    expect(agreement).toEqual({ compared: 33, alike: 29, leftOut: 0, clashes: 1 });
    expect((agreement.alike / agreement.compared).toFixed(4)).toBe('0.8788');
    expect(settlerOf(agreement, DEFAULT_REVIEW_SETTINGS)).toBe('lead');
    expect(n12.filter(({ open }) => open).map(({ q, r }) => [q, r])).toEqual([
      [-1, 0],
      [0, 2],
      [-2, 0],
      [-3, 2],
    ]);
  });

  it.each([
    [at('egg'), at('egg'), 'alike', false],
    [at('egg'), at('empty'), 'differs', true],
    [at('egg'), null, 'field-only', true],
    [null, at('egg'), 'lab-only', true],
    [at('egg'), at('unread'), 'unread', false],
    [at('unread'), at('egg'), 'unread', true],
    [at('unread'), at('unread'), 'unread', false],
    [at('unread'), null, 'unread', false],
    [null, at('unread'), 'unread', true],
  ] as const)('%j and %j stand as %s, to be decided: %s', (...[field, lab, standing, open]) => {
    expect(one(field, lab)).toMatchObject({ standing, open });
  });

  it.each([1, 7, 61, 500])('of %i cells are all compared, in walk order', (count) => {
    const comb = spiral(count).map((cell) => ({ ...cell, state: 'egg' as const, unsure: false }));
    const pairs = compareCells([...comb].reverse(), comb);
    expect(pairs.map(({ q, r }) => [q, r])).toEqual(spiral(count).map(({ q, r }) => [q, r]));
    expect(countAgreement(pairs)).toEqual({ compared: count, alike: count, leftOut: 0, clashes: 0 });
  });
});

describe('who settles', () => {
  const counts = (alike: number, compared: number, clashes = 0) => ({ alike, compared, clashes, leftOut: 0 });

  // At 90 % and no clash over capped, dead, parasitised or webbed the reviewer settles alone (programme default).
  it.each([
    [counts(9, 10), 'reviewer'],
    [counts(899, 1000), 'lead'],
    [counts(10, 10), 'reviewer'],
    [counts(99, 100, 1), 'lead'],
    [counts(0, 0), 'lead'],
  ] as const)('of %j: the %s', (agreement, who) => {
    expect(settlerOf(agreement, DEFAULT_REVIEW_SETTINGS)).toBe(who);
  });

  it('follows the settings', () => {
    const lenient = { ...DEFAULT_REVIEW_SETTINGS, reviewAgreement: 0.5, reviewClashes: 2 };
    expect(settlerOf(counts(5, 10, 2), lenient)).toBe('reviewer');
    expect(settlerOf(counts(5, 10, 3), lenient)).toBe('lead');
  });

  it('by numbers that fit their rule only', () => {
    expect(fitsReviewRule('reviewAgreement', 0.95)).toBe(true);
    expect([1.1, -0.1, '0.9', null].some((value) => fitsReviewRule('reviewAgreement', value))).toBe(false);
  });
});

describe('a suggestion', () => {
  // The field saw depth, the lab saw stillness: egg against empty is the field's where it was sure, else the lab's.
  it.each([
    [at('egg'), at('empty'), 'field'],
    [at('empty'), at('egg'), 'field'],
    [at('empty', true), at('egg'), 'lab'],
    [at('small'), at('medium', true), 'field'],
    [at('small', true), at('medium'), 'lab'],
    [at('unread'), at('medium'), 'lab'],
  ] as const)('for %j against %j takes the %s', (field, lab, pick) => {
    const pair = one(field, lab);
    expect(pair && settleSuggestion(pair)).toMatchObject({ pick });
  });

  it.each([
    [at('small'), at('medium')],
    [at('parasitised', true), at('capped')],
    [at('egg'), at('egg')],
    [at('egg'), null],
  ] as const)('for %j against %j there is none', (field, lab) => {
    const pair = one(field, lab);
    expect(pair && settleSuggestion(pair)).toBeNull();
  });

  it('names one of the five ways to settle', () => {
    expect(['field', 'lab', 'third', 'unsure', 'none'].every(isSettlePick)).toBe(true);
    expect(isSettlePick('average')).toBe(false);
  });
});
