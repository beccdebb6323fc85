import { describe, expect, it } from 'vitest';
import {
  boxAround,
  boxOfWindow,
  cellName,
  cellsAcross,
  followWindow,
  ghostName,
  naturalLook,
  PITCH,
  placeOf,
  rowsOf,
  tallyWords,
} from '@/components/comb/comb-view';
import { neighbours } from '@/lib/comb/axial';
import { emptyTally } from '@/lib/comb/tally';
import { ring, spiral } from '@/lib/comb/walk';

describe('the place of a cell', () => {
  it('lies one pitch from each of its six neighbours', () => {
    const from = { q: 2, r: -3 };
    const { x, y } = placeOf(from);
    for (const next of neighbours(from).map((cell) => placeOf(cell))) {
      expect(Math.hypot(next.x - x, next.y - y)).toBeCloseTo(PITCH, 9);
    }
  });

  it('starts a ring just left of 12', () => {
    const [first, second] = ring(1).map((cell) => placeOf(cell));
    expect(first).toMatchObject({ x: -PITCH / 2 });
    expect(second).toMatchObject({ x: PITCH / 2 });
    expect(first?.y).toBeLessThan(0);
  });

  it('changes sides when the comb is seen from above', () => {
    expect(placeOf({ q: 2, r: 1 }, true)).toEqual({ x: -placeOf({ q: 2, r: 1 }).x, y: placeOf({ q: 2, r: 1 }).y });
    expect(Object.is(placeOf({ q: 0, r: 0 }, true).x, 0)).toBe(true);
  });
});

describe('the box of a drawing', () => {
  it('holds whole cells: a comb of two rings is five across', () => {
    expect(cellsAcross(boxAround(spiral(19)))).toBeCloseTo(5, 9);
  });

  it('has room for one cell before the first is marked', () => {
    expect(cellsAcross(boxAround([]))).toBeCloseTo(1, 9);
  });

  it('of a window is centred on its cell', () => {
    const box = boxOfWindow({ centre: { q: 3, r: 0 }, across: 7, down: 7 });
    expect(box.x + box.width / 2).toBeCloseTo(3 * PITCH, 9);
    expect(box.y + box.height / 2).toBeCloseTo(0, 9);
    expect(cellsAcross(box)).toBeCloseTo(7, 9);
  });

  it('lets a narrow comb shrink with the page; a wide one scrolls, and shrinks on paper', () => {
    expect(naturalLook(9)).toContain('max-w-full');
    expect(naturalLook(26)).toBe('max-w-none print:h-auto print:max-w-full');
  });
});

describe('a window that follows the walk', () => {
  const window = { centre: { q: 0, r: 0 }, across: 7, down: 7 };

  it('stays still while the cell is away from its edge', () => {
    for (const cell of spiral(19)) expect(followWindow(window, cell)).toBe(window);
  });

  it('moves to the cell at its edge', () => {
    expect(followWindow(window, { q: 3, r: 0 }).centre).toEqual({ q: 3, r: 0 });
    expect(followWindow(window, { q: 0, r: -3 }).centre).toEqual({ q: 0, r: -3 });
  });
});

describe('the names of cells', () => {
  it('say number, ring, state and marks', () => {
    expect(cellName({ q: 0, r: 2, state: 'medium', nectar: true })).toBe('cell 13, ring 2, medium larva, nectar');
    expect(cellName({ q: 0, r: 0, state: 'egg', unsure: true, changed: true })).toBe(
      'cell 0, ring 0, egg, unsure, settled by a reviewer',
    );
    expect(ghostName({ q: 0, r: -3 })).toBe('add cell 19, ring 3');
  });
});

describe('a tally in words', () => {
  it('is the field reading of N12, oldest brood first, nectar apart (trade reference 7.3)', () => {
    const tally = {
      ...emptyTally(),
      cellsTotal: 33,
      capped: 6,
      parasitised: 1,
      large: 6,
      medium: 4,
      small: 6,
      egg: 9,
      empty: 1,
      nectarCells: 3,
    };
    expect(tallyWords(tally)).toEqual([
      '6 capped',
      '6 large',
      '4 medium',
      '6 small',
      '9 eggs',
      '1 empty',
      '1 parasitised',
      'nectar in 3',
    ]);
  });

  it('says one egg', () => {
    expect(tallyWords({ ...emptyTally(), egg: 1 })).toEqual(['1 egg']);
  });
});

describe('rows', () => {
  it('run from the top, and in a row from the left', () => {
    expect(rowsOf(ring(1)).map((row) => row.map(({ q, r }) => `${q},${r}`))).toEqual([
      ['0,-1', '1,-1'],
      ['-1,0', '1,0'],
      ['-1,1', '0,1'],
    ]);
  });
});
