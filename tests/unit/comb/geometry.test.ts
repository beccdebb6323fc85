import { describe, expect, it } from 'vitest';
import { neighbours } from '@/lib/comb/axial';
import { cellArea, cellCentre, cellSide } from '@/lib/comb/geometry';

describe('the geometry of the comb', () => {
  it('follows from the pitch: 5 mm gives 21.650635 mm² and a side of 2.886751 mm (check H01)', () => {
    expect(cellArea(5)).toBeCloseTo(21.650635, 6);
    expect(cellSide(5)).toBeCloseTo(2.886751, 6);
  });

  it('puts all six neighbours one pitch away', () => {
    const centre = cellCentre({ q: 2, r: -5 }, 5);
    for (const cell of neighbours({ q: 2, r: -5 })) {
      const { x, y } = cellCentre(cell, 5);
      expect(Math.hypot(x - centre.x, y - centre.y)).toBeCloseTo(5, 12);
    }
  });

  it('draws the pedicel cell at the origin, q to the right, r downwards', () => {
    expect(cellCentre({ q: 0, r: 0 }, 5)).toEqual({ x: 0, y: 0 });
    expect(cellCentre({ q: 1, r: 0 }, 5)).toEqual({ x: 5, y: 0 });
    expect(cellCentre({ q: 0, r: 1 }, 5).y).toBeGreaterThan(0);
  });
});
