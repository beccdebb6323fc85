import { describe, expect, it } from 'vitest';
import { DIRECTIONS, axialDistance, cellKey, isAddress, neighbours, parseCellKey, ringOf } from '@/lib/comb/axial';

describe('axial addresses', () => {
  it('measure steps by the cube metric: (2, −4) to (−1, 2) is 6 (check H03)', () => {
    expect(axialDistance({ q: 2, r: -4 }, { q: -1, r: 2 })).toBe(6);
  });

  it('have six neighbours one step away, clockwise from the upper left', () => {
    expect(neighbours({ q: 3, r: -1 })[0]).toEqual({ q: 3, r: -2 });
    for (const cell of neighbours({ q: 3, r: -1 })) expect(axialDistance(cell, { q: 3, r: -1 })).toBe(1);
    for (const [index, step] of DIRECTIONS.entries()) {
      const next = DIRECTIONS[(index + 1) % 6] ?? step;
      expect(axialDistance(step, next)).toBe(1);
    }
  });

  it('lie in the ring of their distance from the pedicel cell', () => {
    expect(ringOf({ q: 0, r: 0 })).toBe(0);
    expect(ringOf({ q: -3, r: 2 })).toBe(3);
    expect(ringOf({ q: 2, r: 2 })).toBe(4);
  });

  it('read back from their key', () => {
    expect(parseCellKey(cellKey({ q: -12, r: 40 }))).toEqual({ q: -12, r: 40 });
  });

  it('end at 40 in every direction', () => {
    expect(isAddress(40, -40)).toBe(true);
    expect(isAddress(20, 20)).toBe(true);
    expect(isAddress(20, 21)).toBe(false);
    expect(isAddress(41, -41)).toBe(false);
    expect(isAddress(0.5, 0)).toBe(false);
    expect(isAddress('1', 0)).toBe(false);
    expect(isAddress(0, undefined)).toBe(false);
  });
});
