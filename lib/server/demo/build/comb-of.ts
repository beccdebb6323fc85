import 'server-only';
import type { Axial } from '@/lib/comb/axial';
import { type Point, cellCentre } from '@/lib/comb/geometry';
import type { CellState } from '@/lib/comb/states';
import { byWalkOrder, cellsWithinRing, spiral } from '@/lib/comb/walk';
import type { CellStory } from '@/lib/server/demo/story/reading-story';

/** A comb by its counts. */
export interface CombStory {
  counts: Readonly<Partial<Record<CellState, number>>>;
  /** Cells that also hold stored nectar. */
  nectar: number;
  /** Where the comb's middle lies from the pedicel cell, in cell widths. */
  lean: Point;
}

/** From the pedicel outwards: the oldest brood hangs nearest the stalk, new cells and torn ones are at the rim. */
const FROM_THE_PEDICEL: readonly CellState[] = [
  'opened',
  'capped',
  'parasitised',
  'webbed',
  'dead',
  'large',
  'medium',
  'small',
  'egg',
  'empty',
  'unread',
  'damaged',
];

const HOLDS_NECTAR: ReadonlySet<CellState> = new Set(['egg', 'small', 'empty']);

/** Rings searched for the cells of a comb. */
const RINGS = 8;

/** The `count` cells nearest to a point, in walk order: a round comb whose pedicel need not be in its middle. */
function patch(count: number, lean: Point): Axial[] {
  const reach = (cell: Axial) => {
    const { x, y } = cellCentre(cell, 1);
    return Math.round(1e6 * ((x - lean.x) ** 2 + (y - lean.y) ** 2));
  };
  return spiral(cellsWithinRing(RINGS))
    .sort((a, b) => reach(a) - reach(b) || byWalkOrder(a, b))
    .slice(0, count)
    .sort(byWalkOrder);
}

/** Marks `count` of the cells that may hold nectar, spread evenly over them. */
function withNectar(cells: readonly CellStory[], count: number): CellStory[] {
  const able = cells.filter((cell) => HOLDS_NECTAR.has(cell.state));
  const chosen = new Set(Array.from({ length: count }, (_, i) => able[Math.floor(((i + 0.5) * able.length) / count)]));
  return cells.map((cell) => (chosen.has(cell) ? { ...cell, nectar: true } : cell));
}

/**
 * Lays counts out on a comb: ring by ring from the pedicel, oldest brood first.
 *
 * @returns one cell a count, in walk order; always the same for the same story.
 */
export function combOf({ counts, nectar, lean }: CombStory): CellStory[] {
  const states = FROM_THE_PEDICEL.flatMap((state) => Array.from({ length: counts[state] ?? 0 }, () => state));
  const cells = patch(states.length, lean).map((cell, i): CellStory => ({ ...cell, state: states[i] ?? 'unread' }));
  return withNectar(cells, nectar);
}
