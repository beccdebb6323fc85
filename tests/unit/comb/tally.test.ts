import { describe, expect, it } from 'vitest';
import { CELL_STATES, type CellState, STATE_LETTERS, STATE_WORDS, isCellState } from '@/lib/comb/states';
import { tallyOf } from '@/lib/comb/tally';
import n12 from '@/tests/fixtures/comb/n12.json';

const BY_LETTER: Readonly<Record<string, CellState>> = {
  c: 'capped',
  l: 'large',
  m: 'medium',
  s: 'small',
  e: 'egg',
  p: 'parasitised',
  '-': 'empty',
};

function column(index: 3 | 4 | 5) {
  return n12.cells.map((cell) => ({ state: BY_LETTER[String(cell[index])] ?? 'unread', nectar: false }));
}

describe('the tally of N12, counted by hand', () => {
  it('of the field reading is 6 capped, 1 parasitised, 6 large, 4 medium, 6 small, 9 eggs, 1 empty', () => {
    const { capped, parasitised, large, medium, small, egg, empty, cellsTotal } = tallyOf(column(3));
    expect({ capped, parasitised, large, medium, small, egg, empty, cellsTotal }).toEqual({
      capped: 6,
      parasitised: 1,
      large: 6,
      medium: 4,
      small: 6,
      egg: 9,
      empty: 1,
      cellsTotal: 33,
    });
  });

  it('of the blind reading is 7, 0, 7, 4, 5, 10, 0', () => {
    const { capped, parasitised, large, medium, small, egg, empty } = tallyOf(column(4));
    expect([capped, parasitised, large, medium, small, egg, empty]).toEqual([7, 0, 7, 4, 5, 10, 0]);
  });

  it('of the final reading is 6, 1, 7, 3, 6, 10, 0', () => {
    const { capped, parasitised, large, medium, small, egg, empty } = tallyOf(column(5));
    expect([capped, parasitised, large, medium, small, egg, empty]).toEqual([6, 1, 7, 3, 6, 10, 0]);
  });
});

describe('any tally', () => {
  it('counts unread cells in the total and nectar apart from the stages', () => {
    const tally = tallyOf([
      { state: 'unread', nectar: false },
      { state: 'egg', nectar: true },
      { state: 'empty', nectar: true },
    ]);
    expect(tally.cellsTotal).toBe(3);
    expect(tally.nectarCells).toBe(2);
    expect(CELL_STATES.reduce((sum, state) => sum + tally[state], 0)).toBe(tally.cellsTotal);
  });

  it('knows twelve states, each with words and a letter of its own', () => {
    expect(CELL_STATES).toHaveLength(12);
    expect(new Set(Object.values(STATE_LETTERS)).size).toBe(12);
    expect(Object.keys(STATE_WORDS)).toEqual([...CELL_STATES]);
    expect(isCellState('large')).toBe(true);
    expect(isCellState('Large')).toBe(false);
    expect(isCellState(3)).toBe(false);
  });
});
