import { type Axial, cellKey } from './axial';
import type { MarkContent } from './mark';
import type { CellState } from './states';
import { byWalkOrder } from './walk';

/** What one reader saw in a cell. */
export interface Seen {
  state: CellState;
  unsure: boolean;
}

/**
 * How two readings stand to each other in one cell.
 * `alike` and `differs`: both read it. `field-only` and `lab-only`: the other reader has no such cell.
 * `unread`: at least one of them could not tell what is in it.
 */
export type PairStanding = 'alike' | 'differs' | 'field-only' | 'lab-only' | 'unread';

/** One cell as two readers saw it. */
export interface CellPair extends Axial {
  /** Null where the reader has no such cell. */
  field: Seen | null;
  lab: Seen | null;
  standing: PairStanding;
  /** Must somebody decide what the final reading says here? */
  open: boolean;
  /** Do they differ over a state that changes what the comb means? */
  clash: boolean;
}

/** A difference over one of these is never a matter of a few days. */
const CLASH_STATES: ReadonlySet<CellState> = new Set(['capped', 'dead', 'parasitised', 'webbed']);

type ReadCellView = Pick<MarkContent, 'q' | 'r' | 'state' | 'unsure'>;

function seenIn(cells: readonly ReadCellView[]): Map<string, Seen> {
  return new Map(cells.map((cell) => [cellKey(cell), { state: cell.state, unsure: cell.unsure }]));
}

function standingOf(field: Seen | null, lab: Seen | null): PairStanding {
  if (field?.state === 'unread' || lab?.state === 'unread') return 'unread';
  if (!lab) return 'field-only';
  if (!field) return 'lab-only';
  return field.state === lab.state ? 'alike' : 'differs';
}

/** The final reading begins as the field reading, so where only the lab could tell, somebody has to say so. */
function isOpen(standing: PairStanding, field: Seen | null, lab: Seen | null): boolean {
  if (standing === 'alike') return false;
  if (standing !== 'unread') return true;
  return field?.state === 'unread' ? lab !== null && lab.state !== 'unread' : field === null;
}

function pairOf({ q, r }: Axial, field: Seen | null, lab: Seen | null): CellPair {
  const standing = standingOf(field, lab);
  const clashes = [field, lab].some((seen) => seen !== null && CLASH_STATES.has(seen.state));
  return { q, r, field, lab, standing, open: isOpen(standing, field, lab), clash: standing === 'differs' && clashes };
}

/**
 * Lays two readings of one comb over each other.
 *
 * @param field the cells of the reading made at the nest.
 * @param lab the cells of the second reading.
 * @returns one pair for each cell that either has, in walk order.
 */
export function compareCells(field: readonly ReadCellView[], lab: readonly ReadCellView[]): CellPair[] {
  const [inField, inLab] = [seenIn(field), seenIn(lab)];
  const places = new Map([...field, ...lab].map((cell) => [cellKey(cell), cell]));
  return [...places.entries()]
    .map(([key, place]) => pairOf(place, inField.get(key) ?? null, inLab.get(key) ?? null))
    .sort(byWalkOrder);
}
