import { type Axial, MAX_ADDRESS, isAddress, neighbours, ringOf } from './axial';
import { byWalkOrder, ring } from './walk';

/** What the walk knows about a comb while it is being read. */
export interface WalkInput {
  /** Cells of the last map; empty at the first reading. */
  known: Iterable<Axial>;
  /** Cells that have a live mark in this reading. */
  marked: Iterable<Axial>;
  /** Addresses where the person found no cell. */
  skipped: Iterable<Axial>;
  /** Cells counted on the comb, or null. The walk ends when as many are marked. */
  expectedTotal: number | null;
}

const PEDICEL: Axial = { q: 0, r: 0 };

/** A whole number for an address, cheaper in sets than text. */
function code({ q, r }: Axial): number {
  return (q + 2 * MAX_ADDRESS) * 8 * MAX_ADDRESS + (r + 2 * MAX_ADDRESS);
}

function codesOf(cells: Iterable<Axial>): Set<number> {
  const codes = new Set<number>();
  for (const cell of cells) codes.add(code(cell));
  return codes;
}

/**
 * The cells that exist as far as is known: marked ones, and known ones that were not found missing.
 * A comb without any stands on the pedicel cell, so that a walk can begin even where that one is gone.
 */
function existing({ known, marked }: WalkInput, skipped: ReadonlySet<number>): Map<number, Axial> {
  const cells = new Map<number, Axial>();
  for (const cell of known) if (!skipped.has(code(cell))) cells.set(code(cell), cell);
  for (const cell of marked) cells.set(code(cell), cell);
  if (cells.size === 0) cells.set(code(PEDICEL), PEDICEL);
  return cells;
}

function touches(cell: Axial, comb: ReadonlyMap<number, Axial>): boolean {
  return neighbours(cell).some((next) => comb.has(code(next)));
}

/** The furthest ring that holds a cell. */
function outermostRing(comb: ReadonlyMap<number, Axial>): number {
  let outermost = 0;
  for (const cell of comb.values()) outermost = Math.max(outermost, ringOf(cell));
  return outermost;
}

/**
 * The cell a person reads next: the first in spiral order that is known or touches the comb, has no mark and was not
 * found missing. The pedicel cell comes first on an empty comb.
 *
 * @returns null when the expected total is marked, or when no address is left to ask about.
 */
export function nextCell(input: WalkInput): Axial | null {
  const marked = codesOf(input.marked);
  if (input.expectedTotal !== null && marked.size >= input.expectedTotal) return null;
  const skipped = codesOf(input.skipped);
  const comb = existing(input, skipped);
  for (let k = 0; k <= outermostRing(comb) + 1; k++) {
    for (const cell of ring(k)) {
      const at = code(cell);
      if (marked.has(at) || skipped.has(at) || !isAddress(cell.q, cell.r)) continue;
      if (comb.has(at) || touches(cell, comb)) return cell;
    }
  }
  return null;
}

/**
 * The free addresses that touch the comb, in spiral order: where a new cell can be added.
 * An empty comb offers the pedicel cell.
 *
 * @param comb the cells that exist.
 */
export function rimCells(comb: Iterable<Axial>): Axial[] {
  const cells = [...comb];
  if (cells.length === 0) return [PEDICEL];
  const taken = codesOf(cells);
  const rim = new Map<number, Axial>();
  for (const cell of cells) {
    for (const next of neighbours(cell)) {
      if (!taken.has(code(next)) && isAddress(next.q, next.r)) rim.set(code(next), next);
    }
  }
  return [...rim.values()].sort(byWalkOrder);
}
