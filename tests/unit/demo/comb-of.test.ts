import { describe, expect, it } from 'vitest';
import { cellKey, neighbours } from '@/lib/comb/axial';
import { cellNumber, spiral } from '@/lib/comb/walk';
import { combOf } from '@/lib/server/demo/build/comb-of';
import { readingsFromSheet } from '@/lib/server/demo/build/readings-from-sheet';

describe('a comb laid out from its counts', () => {
  it('is the spiral itself when it does not lean and its rings are full', () => {
    const cells = combOf({ counts: { egg: 19 }, nectar: 0, lean: { x: 0, y: 0 } });
    expect(cells.map(cellKey)).toEqual(spiral(19).map(cellKey));
  });

  it('hangs together, whichever way it leans', () => {
    for (const lean of [
      { x: 0.9, y: -0.3 },
      { x: -0.8, y: 0.2 },
      { x: 0.2, y: 0.9 },
    ]) {
      const cells = combOf({ counts: { large: 5, egg: 26 }, nectar: 0, lean });
      const keys = new Set(cells.map(cellKey));
      expect(keys.has('0,0')).toBe(true);
      expect(cells.filter((cell) => !neighbours(cell).some((next) => keys.has(cellKey(next))))).toEqual([]);
    }
  });

  it('is given in walk order, oldest brood first', () => {
    const cells = combOf({ counts: { egg: 3, capped: 2, small: 1 }, nectar: 0, lean: { x: 0.1, y: 0 } });
    const numbers = cells.map(cellNumber);
    expect(numbers).toEqual([...numbers].sort((a, b) => a - b));
    expect(cells.map(({ state }) => state)).toEqual(['capped', 'capped', 'small', 'egg', 'egg', 'egg']);
  });

  it('spreads nectar over as many cells as asked for', () => {
    const cells = combOf({ counts: { large: 4, small: 5, egg: 8 }, nectar: 4, lean: { x: 0, y: 0 } });
    expect(cells.filter(({ nectar }) => nectar)).toHaveLength(4);
    expect(cells.filter(({ state, nectar }) => state === 'large' && nectar)).toEqual([]);
  });
});

describe('a typed sheet', () => {
  it('gives three readings of each cell', () => {
    const { field, blind, final } = readingsFromSheet('0,0,0,c,c,c 6,-1,0,p,c,p');
    expect(field).toEqual([
      { q: 0, r: 0, state: 'capped' },
      { q: -1, r: 0, state: 'parasitised' },
    ]);
    expect([blind[1]?.state, final[1]?.state]).toEqual(['capped', 'parasitised']);
  });

  it('is refused with a letter that is not on it', () => {
    expect(() => readingsFromSheet('0,0,0,c,z,c')).toThrow('z');
  });
});
