/** An axial address on the comb: the pedicel cell is (0, 0), hexagons are pointy-top, `r` grows downwards. */
export interface Axial {
  q: number;
  r: number;
}

/** The furthest address a comb may use: |q|, |r| and |q + r| stay within it. */
export const MAX_ADDRESS = 40;

/** The six neighbours in clockwise order, starting at the upper left (towards (0, −1)). */
export const DIRECTIONS: readonly Axial[] = [
  { q: 0, r: -1 },
  { q: 1, r: -1 },
  { q: 1, r: 0 },
  { q: 0, r: 1 },
  { q: -1, r: 1 },
  { q: -1, r: 0 },
];

/** A string key for maps and sets: `"q,r"`. */
export function cellKey(cell: Axial): string {
  return `${cell.q},${cell.r}`;
}

/** Reads a `cellKey` back. */
export function parseCellKey(key: string): Axial {
  const comma = key.indexOf(',');
  return { q: Number(key.slice(0, comma)), r: Number(key.slice(comma + 1)) };
}

/** Is this a whole-number address within the largest comb the product takes? */
export function isAddress(q: unknown, r: unknown): boolean {
  if (!Number.isInteger(q) || !Number.isInteger(r)) return false;
  const [a, b] = [Number(q), Number(r)];
  return Math.max(Math.abs(a), Math.abs(b), Math.abs(a + b)) <= MAX_ADDRESS;
}

/** Steps between two cells: (|dq| + |dr| + |dq + dr|) / 2. */
export function axialDistance(a: Axial, b: Axial): number {
  const dq = a.q - b.q;
  const dr = a.r - b.r;
  return (Math.abs(dq) + Math.abs(dr) + Math.abs(dq + dr)) / 2;
}

/** The ring of a cell: its distance from the pedicel cell. */
export function ringOf(cell: Axial): number {
  return axialDistance(cell, { q: 0, r: 0 });
}

/** The six cells around one, clockwise from the upper left. */
export function neighbours(cell: Axial): Axial[] {
  return DIRECTIONS.map((d) => ({ q: cell.q + d.q, r: cell.r + d.r }));
}
