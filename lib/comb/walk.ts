import { type Axial, ringOf } from './axial';

/** Sides of a ring in walking order: from (0, −k) clockwise, each side is k steps long. */
const SIDES: readonly Axial[] = [
  { q: 1, r: 0 },
  { q: 0, r: 1 },
  { q: -1, r: 1 },
  { q: -1, r: 0 },
  { q: 0, r: -1 },
  { q: 1, r: -1 },
];

/** Cells in the comb up to and with ring `k`: 1 + 3k(k + 1). */
export function cellsWithinRing(k: number): number {
  return 1 + 3 * k * (k + 1);
}

/**
 * The cells of ring `k` in walk order: starting at (0, −k), just left of 12, going clockwise.
 * Ring 0 is the pedicel cell alone.
 */
export function ring(k: number): Axial[] {
  if (k === 0) return [{ q: 0, r: 0 }];
  const cells: Axial[] = [];
  let at: Axial = { q: 0, r: -k };
  for (const side of SIDES) {
    for (let step = 0; step < k; step++) {
      cells.push(at);
      at = { q: at.q + side.q, r: at.r + side.r };
    }
  }
  return cells;
}

/** The first `count` cells of the spiral walk, ring after ring from the pedicel cell. */
export function spiral(count: number): Axial[] {
  const cells: Axial[] = [];
  for (let k = 0; cells.length < count; k++) cells.push(...ring(k));
  return cells.slice(0, count);
}

/** Steps along the ring from its start (0, −k) to the cell. */
function positionInRing({ q, r }: Axial, k: number): number {
  if (r === -k && q < k) return q;
  if (q === k && r < 0) return k + (r + k);
  if (q + r === k && r < k) return 2 * k + r;
  if (r === k && q > -k) return 3 * k - q;
  if (q === -k && r > 0) return 4 * k + (k - r);
  return 5 * k + (q + k);
}

/**
 * The number printed for a cell: 0 for the pedicel cell, else 1 + 3k(k − 1) + its position in ring k.
 * A pure function of the address, so a number never shifts when the comb grows.
 */
export function cellNumber(cell: Axial): number {
  const k = ringOf(cell);
  return k === 0 ? 0 : 1 + 3 * k * (k - 1) + positionInRing(cell, k);
}

/** Compares two cells by walk order. */
export function byWalkOrder(a: Axial, b: Axial): number {
  return cellNumber(a) - cellNumber(b);
}
