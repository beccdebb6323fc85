import { type Axial, cellKey } from '@/lib/comb/axial';
import { cellCentre } from '@/lib/comb/geometry';
import { byWalkOrder } from '@/lib/comb/walk';

/** The keys that move the focus on a comb. */
export type StepKey = 'ArrowLeft' | 'ArrowRight' | 'ArrowUp' | 'ArrowDown' | 'Home' | 'End' | 'PageUp' | 'PageDown';

const STEP_KEYS: readonly string[] = [
  'ArrowLeft',
  'ArrowRight',
  'ArrowUp',
  'ArrowDown',
  'Home',
  'End',
  'PageUp',
  'PageDown',
] satisfies readonly StepKey[];

/** Is this a key that moves on the comb? */
export function isStepKey(key: string): key is StepKey {
  return STEP_KEYS.includes(key);
}

const isOdd = (n: number): boolean => Math.abs(n) % 2 === 1;

/**
 * The neighbour above or below. Each hexagon has two: going straight up or down takes them in turn (right from an
 * even row, left from an odd one), so that a column stays a column; `other` takes the one left out.
 */
function verticalNeighbour(from: Axial, rows: 1 | -1, other: boolean): Axial {
  const rightwards = isOdd(from.r) === other;
  const r = from.r + rows;
  if (rows === -1) return { q: rightwards ? from.q + 1 : from.q, r };
  return { q: rightwards ? from.q : from.q - 1, r };
}

/** The place of a row that lies nearest to a cell, or null when the row is bare. */
function nearestInRow(places: readonly Axial[], row: number, from: Axial): Axial | null {
  const x = cellCentre(from, 1).x;
  const gap = (place: Axial): number => Math.abs(cellCentre(place, 1).x - x);
  const [nearest] = places.filter((place) => place.r === row).sort((a, b) => gap(a) - gap(b));
  return nearest ?? null;
}

/** The next place to the left or right in the same row, over any hole. */
function sideways(places: readonly Axial[], from: Axial, columns: 1 | -1): Axial | null {
  const ahead = places.filter((place) => place.r === from.r && (place.q - from.q) * columns > 0);
  ahead.sort((a, b) => (a.q - b.q) * columns);
  return ahead[0] ?? null;
}

/** The place some steps further in walk order, or null past either end. */
function alongWalk(places: readonly Axial[], from: Axial, steps: number): Axial | null {
  const ordered = [...places].sort(byWalkOrder);
  const at = ordered.findIndex((place) => cellKey(place) === cellKey(from));
  return ordered[at + steps] ?? null;
}

/** A press of a step key; with Shift, up and down take the other of the two neighbours. */
export interface Step {
  key: StepKey;
  shift: boolean;
}

/**
 * Where a key leads from a cell: arrows to the six neighbours, Home to the first and End to the last cell of the walk,
 * PageUp and PageDown one cell back and on in the walk. Stays where it is when there is nothing that way.
 */
export function stepFrom(from: Axial, { key, shift }: Step, places: readonly Axial[]): Axial {
  const ordered = (): Axial[] => [...places].sort(byWalkOrder);
  const vertical = (rows: 1 | -1): Axial | null => {
    const wanted = cellKey(verticalNeighbour(from, rows, shift));
    return places.find((place) => cellKey(place) === wanted) ?? nearestInRow(places, from.r + rows, from);
  };
  const moves: Record<StepKey, () => Axial | null | undefined> = {
    ArrowLeft: () => sideways(places, from, -1),
    ArrowRight: () => sideways(places, from, 1),
    ArrowUp: () => vertical(-1),
    ArrowDown: () => vertical(1),
    Home: () => ordered()[0],
    End: () => ordered().at(-1),
    PageUp: () => alongWalk(places, from, -1),
    PageDown: () => alongWalk(places, from, 1),
  };
  return moves[key]() ?? from;
}
