import { describe, expect, it } from 'vitest';
import type { PairRow } from '@/components/lab/review/review-shapes';
import { EMPTY_DRAFT, settleOptions, settledCell } from '@/components/lab/review/settle-choice';

const PAIR: PairRow = {
  q: 1,
  r: 0,
  field: { state: 'egg', unsure: false },
  lab: { state: 'empty', unsure: false },
  standing: 'differs',
  open: true,
  clash: false,
  suggestion: null,
  settled: null,
};

describe('settling one cell', () => {
  it('offers both views, a third state and that nobody can tell', () => {
    expect(settleOptions(PAIR).map(({ pick }) => pick)).toEqual(['field', 'lab', 'unsure', 'third']);
  });

  it('offers that there is no such cell where one reader has none', () => {
    expect(settleOptions({ ...PAIR, lab: null }).map(({ pick }) => pick)).toEqual(['field', 'none', 'unsure', 'third']);
  });

  it('sends the state of whoever is picked, with the reason', () => {
    expect(settledCell(PAIR, { pick: 'lab', third: null, reason: ' Clean floor. ' })).toEqual({
      q: 1,
      r: 0,
      state: 'empty',
      reason: 'Clean floor.',
      pick: 'lab',
    });
    expect(settledCell(PAIR, { pick: 'third', third: 'dead', reason: 'Dry.' })).toMatchObject({ state: 'dead' });
    expect(settledCell(PAIR, { pick: 'unsure', third: 'dead', reason: 'Dark.' })).toMatchObject({ state: 'unread' });
  });

  it('says what is missing', () => {
    expect(settledCell(PAIR, EMPTY_DRAFT)).toContain('whose view');
    expect(settledCell(PAIR, { ...EMPTY_DRAFT, pick: 'third', reason: 'x' })).toContain('third state');
    expect(settledCell(PAIR, { ...EMPTY_DRAFT, pick: 'field' })).toContain('why');
  });
});
