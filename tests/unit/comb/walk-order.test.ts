import { describe, expect, test } from 'vitest';
import { type Axial, cellKey } from '@/lib/comb/axial';
import { ring, spiral } from '@/lib/comb/walk';
import { type WalkInput, nextCell, rimCells } from '@/lib/comb/walk-order';

const nothing: WalkInput = { known: [], marked: [], skipped: [], expectedTotal: null };

/** Walks until it ends, marking each cell for which `exists` says so and finding the others missing. */
function walk(exists: (cell: Axial) => boolean, part: Partial<WalkInput> = {}) {
  const marked: Axial[] = [];
  const skipped: Axial[] = [];
  for (;;) {
    const cell = nextCell({ ...nothing, ...part, marked, skipped });
    if (!cell) return { marked, skipped };
    (exists(cell) ? marked : skipped).push(cell);
  }
}

describe('the next cell of the walk', () => {
  test('is the pedicel cell on an empty comb', () => {
    expect(nextCell(nothing)).toEqual({ q: 0, r: 0 });
  });

  test('follows the spiral on a round comb of any size', () => {
    for (const size of [1, 7, 19, 37, 61, 500]) {
      const { marked, skipped } = walk(() => true, { expectedTotal: size });
      expect(marked).toEqual(spiral(size));
      expect(skipped).toEqual([]);
    }
  });

  test('asks about each rim address once when the total is not known, and then ends', () => {
    const comb = new Set(spiral(7).map(cellKey));
    const { marked, skipped } = walk((cell) => comb.has(cellKey(cell)));
    expect(marked).toEqual(spiral(7));
    expect(skipped).toEqual(ring(2));
  });

  test('reaches every cell of a lopsided comb', () => {
    const comb = [0, 1, 2, 3, 4, 5, 6, 7].map((q) => ({ q, r: 0 }));
    const keys = new Set(comb.map(cellKey));
    const { marked } = walk((cell) => keys.has(cellKey(cell)));
    expect(marked.map(cellKey).sort()).toEqual([...keys].sort());
  });

  test('goes over known cells that touch nothing marked yet', () => {
    const known = [{ q: 3, r: 0 }];
    expect(nextCell({ ...nothing, known, marked: [] })).toEqual({ q: 2, r: 0 });
    expect(walk((cell) => cell.q === 3 && cell.r === 0, { known }).marked).toEqual(known);
  });

  test('offers only addresses that touch the comb', () => {
    expect(nextCell({ ...nothing, marked: spiral(1), skipped: ring(1).slice(0, 5) })).toEqual(ring(1)[5]);
    expect(nextCell({ ...nothing, marked: spiral(1), skipped: ring(1) })).toBeNull();
  });

  test('ends when as many cells are marked as were counted', () => {
    expect(nextCell({ ...nothing, marked: spiral(5), expectedTotal: 5 })).toBeNull();
    expect(nextCell({ ...nothing, marked: spiral(4), expectedTotal: 5 })).toEqual(spiral(5)[4]);
  });

  test('begins around the pedicel cell where that one is gone', () => {
    expect(nextCell({ ...nothing, skipped: [{ q: 0, r: 0 }] })).toEqual({ q: 0, r: -1 });
  });

  test('leaves a known cell out that was found missing, and its rim with it', () => {
    const known = [
      { q: 0, r: 0 },
      { q: 5, r: 0 },
    ];
    const { marked } = walk((cell) => cell.q === 0 && cell.r === 0, { known });
    expect(marked).toEqual([{ q: 0, r: 0 }]);
  });

  test('never leaves the largest comb', () => {
    const row = Array.from({ length: 41 }, (_, q) => ({ q, r: 0 }));
    const { marked, skipped } = walk(({ r }) => r === 0, { known: row });
    for (const { q, r } of [...marked, ...skipped]) {
      expect(Math.max(Math.abs(q), Math.abs(r), Math.abs(q + r))).toBeLessThanOrEqual(40);
    }
  });

  test('is found within a few milliseconds at 500 cells', () => {
    const input = { ...nothing, known: spiral(500), marked: spiral(499) };
    const began = performance.now();
    for (let i = 0; i < 20; i++) nextCell(input);
    expect((performance.now() - began) / 20).toBeLessThan(10);
  });
});

describe('the rim', () => {
  test('of an empty comb is the pedicel cell', () => {
    expect(rimCells([])).toEqual([{ q: 0, r: 0 }]);
  });

  test('of a full ring is the next ring, in walk order', () => {
    expect(rimCells(spiral(1))).toEqual(ring(1));
    expect(rimCells(spiral(7))).toEqual(ring(2));
  });

  test('holds the gaps inside the comb', () => {
    const gap = { q: 1, r: 0 };
    const comb = spiral(19).filter((cell) => cellKey(cell) !== cellKey(gap));
    expect(rimCells(comb)[0]).toEqual(gap);
  });
});
