import { describe, expect, it } from 'vitest';
import { axialDistance, cellKey } from '@/lib/comb/axial';
import { byWalkOrder, cellNumber, cellsWithinRing, ring, spiral } from '@/lib/comb/walk';
import n12 from '@/tests/fixtures/comb/n12.json';

describe('the walk', () => {
  it('has 91 cells up to ring 5: 1 + 3n(n + 1) (check H02)', () => {
    expect(cellsWithinRing(5)).toBe(91);
    expect(spiral(91)).toHaveLength(91);
  });

  it('numbers the 33 cells of nest N12 as its reference reading does', () => {
    for (const [number, q, r] of n12.cells) expect(cellNumber({ q: Number(q), r: Number(r) })).toBe(number);
    expect(spiral(33).map(({ q, r }) => [q, r])).toEqual(n12.cells.map(([, q, r]) => [q, r]));
  });

  it('starts a ring just left of 12, at (0, −k), and goes on step by step without a gap', () => {
    for (let k = 1; k <= 40; k++) {
      const cells = ring(k);
      expect(cells).toHaveLength(6 * k);
      expect(cells[0]).toEqual({ q: 0, r: -k });
      const steps = cells.map((cell, index) => axialDistance(cell, cells[(index + 1) % cells.length] ?? cell));
      expect(new Set(steps)).toEqual(new Set([1]));
    }
  });

  it('gives every cell of the largest comb a number of its own, in walk order', () => {
    const all = spiral(cellsWithinRing(40));
    expect(new Set(all.map(cellKey)).size).toBe(all.length);
    expect(all.map(cellNumber)).toEqual([...all.keys()]);
    expect([...all].reverse().sort(byWalkOrder)).toEqual(all);
  });
});
