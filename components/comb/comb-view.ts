import { type Axial, ringOf } from '@/lib/comb/axial';
import { cellCentre, type Point } from '@/lib/comb/geometry';
import type { Tally } from '@/lib/comb/tally';
import { STATE_WORDS, type CellState } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';

/** One cell as the drawing needs it: what was seen, the small marks, and how it stands in its reading. */
export interface CombCellView extends Axial {
  state: CellState;
  nectar?: boolean;
  unsure?: boolean;
  reused?: boolean;
  scrap?: boolean;
  /** A note or a photo hangs on the cell. */
  noted?: boolean;
  /** A reviewer settled the cell otherwise than the observer marked it. */
  changed?: boolean;
  /** Pressed, but not yet known to be stored: drawn faint until it is. */
  pending?: boolean;
  /** Not marked yet; `state` is what the estimate expects there today: drawn faint. */
  expected?: boolean;
  /** Days since the egg was laid, by the estimate: written into the cell, which is coloured by it. */
  ageDays?: number;
}

/** What the diagram can do with a place: a cell of the comb, or a free place on its rim. */
export type PlaceKind = 'cell' | 'ghost';

/** A part of the comb to show large: `across` cells wide and `down` rows high around a cell. */
export interface CombWindow {
  centre: Axial;
  across: number;
  down: number;
}

/** A rectangle in drawing units. */
export interface Box {
  x: number;
  y: number;
  width: number;
  height: number;
}

/** Flat-to-flat width of a cell in drawing units; the symbols are drawn in a box of 48 around it. */
export const PITCH = 38;

/** Side of the box a symbol is drawn in. */
export const SYMBOL_BOX = 48;

/** Cells narrower than this on the page show their state only: marks would blur. */
export const SMALLEST_MARKED_CELL = 20;

const MARGIN = 6;
const CORNER = 22;

/** The centre of a cell in drawing units, with the pedicel cell at (0, 0); mirrored is the comb seen from above. */
export function placeOf(cell: Axial, mirrored = false): Point {
  const { x, y } = cellCentre(cell, PITCH);
  return { x: mirrored && x !== 0 ? -x : x, y };
}

/** The rectangle that holds all the given cells with a little room around them; one cell's room when there are none. */
export function boxAround(cells: readonly Axial[], mirrored = false): Box {
  const centres = cells.length > 0 ? cells.map((cell) => placeOf(cell, mirrored)) : [{ x: 0, y: 0 }];
  const xs = centres.map((centre) => centre.x);
  const ys = centres.map((centre) => centre.y);
  const x = Math.min(...xs) - PITCH / 2 - MARGIN;
  const y = Math.min(...ys) - CORNER - MARGIN;
  return {
    x,
    y,
    width: Math.max(...xs) + PITCH / 2 + MARGIN - x,
    height: Math.max(...ys) + CORNER + MARGIN - y,
  };
}

/** The rectangle of a window: whole cells, centred on its cell. */
export function boxOfWindow({ centre, across, down }: CombWindow, mirrored = false): Box {
  const { x, y } = placeOf(centre, mirrored);
  const width = across * PITCH + 2 * MARGIN;
  const height = (down - 1) * (Math.sqrt(3) / 2) * PITCH + 2 * (CORNER + MARGIN);
  return { x: x - width / 2, y: y - height / 2, width, height };
}

/**
 * The window to show when the walk has reached `cell`: the same one while the cell is at least one cell away
 * from its edge, so that nothing moves during most steps; otherwise centred on the cell.
 */
export function followWindow(window: CombWindow, cell: Axial): CombWindow {
  const from = placeOf(window.centre);
  const to = placeOf(cell);
  const sideways = Math.abs(to.x - from.x) / PITCH;
  const rows = Math.abs(cell.r - window.centre.r);
  const inside = sideways <= (window.across - 1) / 2 - 1 && rows <= (window.down - 1) / 2 - 1;
  return inside ? window : { ...window, centre: cell };
}

/** How many cell widths the drawing is across. */
export function cellsAcross(box: Box): number {
  return (box.width - 2 * MARGIN) / PITCH;
}

/** Cells that the narrowest phone can still show at a readable size. */
const ACROSS_A_PHONE = 16;

/**
 * The classes of a comb at its natural size: a narrow one shrinks with the page; a wide one keeps its size and is
 * scrolled in its own box, because its cells would become too small to tell apart.
 */
export function naturalLook(across: number): string {
  return across <= ACROSS_A_PHONE ? 'h-auto max-w-full' : 'max-w-none print:h-auto print:max-w-full';
}

const MARK_WORDS = [
  ['nectar', 'nectar'],
  ['unsure', 'unsure'],
  ['reused', 'reused'],
  ['scrap', 'prey scrap'],
  ['noted', 'note'],
  ['changed', 'settled by a reviewer'],
  ['pending', 'not yet saved'],
] as const satisfies readonly (readonly [keyof CombCellView, string])[];

/** What a cell is called aloud: `cell 13, ring 2, medium larva, nectar`. */
export function cellName(cell: CombCellView): string {
  if (cell.expected)
    return `cell ${cellNumber(cell)}, ring ${ringOf(cell)}, no mark, expected ${STATE_WORDS[cell.state]}`;
  const age = cell.ageDays === undefined ? [] : [`about ${cell.ageDays} days old`];
  const marks = MARK_WORDS.filter(([mark]) => cell[mark] === true).map(([, word]) => word);
  return [`cell ${cellNumber(cell)}`, `ring ${ringOf(cell)}`, STATE_WORDS[cell.state], ...age, ...marks].join(', ');
}

/** What a free place on the rim is called aloud. */
export function ghostName(place: Axial): string {
  return `add cell ${cellNumber(place)}, ring ${ringOf(place)}`;
}

const TALLY_WORDS: Readonly<Record<CellState, readonly [one: string, many: string]>> = {
  capped: ['capped', 'capped'],
  large: ['large', 'large'],
  medium: ['medium', 'medium'],
  small: ['small', 'small'],
  egg: ['egg', 'eggs'],
  empty: ['empty', 'empty'],
  opened: ['opened', 'opened'],
  dead: ['dead', 'dead'],
  parasitised: ['parasitised', 'parasitised'],
  webbed: ['webbed', 'webbed'],
  damaged: ['damaged', 'damaged'],
  unread: ['unread', 'unread'],
};

/** The order tallies are said in: oldest brood first, unread last. */
const TALLY_ORDER = [
  'capped',
  'large',
  'medium',
  'small',
  'egg',
  'empty',
  'opened',
  'dead',
  'parasitised',
  'webbed',
  'damaged',
  'unread',
] as const satisfies readonly CellState[];

/**
 * A tally in words, only what is there: `["6 capped", "9 eggs", "1 empty", "nectar in 3"]`.
 * Nectar comes last and apart, because it never counts in the sum of states.
 */
export function tallyWords(tally: Tally): string[] {
  const words = TALLY_ORDER.filter((state) => tally[state] > 0).map(
    (state) => `${tally[state]} ${TALLY_WORDS[state][tally[state] === 1 ? 0 : 1]}`,
  );
  return tally.nectarCells > 0 ? [...words, `nectar in ${tally.nectarCells}`] : words;
}

/** Groups places by row, top row first and left to right in it, as the eye and the grid read them. */
export function rowsOf<T extends Axial>(places: readonly T[]): T[][] {
  const rows = new Map<number, T[]>();
  for (const place of places) rows.set(place.r, [...(rows.get(place.r) ?? []), place]);
  return [...rows.entries()].sort(([a], [b]) => a - b).map(([, row]) => row.sort((a, b) => a.q - b.q));
}

/** Is the pedicel cell, (0, 0), among these? */
export function hasPedicel(places: readonly Axial[]): boolean {
  return places.some(({ q, r }) => q === 0 && r === 0);
}
