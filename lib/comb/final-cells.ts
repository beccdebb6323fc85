import { type Axial, cellKey } from './axial';
import type { Mark, MarkContent } from './mark';
import type { SettlePick } from './settle-pick';
import type { CellState } from './states';
import { byWalkOrder } from './walk';

/** A reviewer's decision about one cell of a final reading. */
export interface CellSettlement extends Axial {
  state: CellState;
  /** Order of decisions within the final reading; a later one replaces an earlier one of the same cell. */
  position: number;
  /** The mark it replaced; null when nobody had marked the cell. */
  markOpId: string | null;
  /** Whose view it takes; null for a correction without a second reading. */
  pick?: SettlePick | null;
}

/** One cell of a reading as it stands: marked by the observer, or settled. */
export interface ReadCell extends MarkContent {
  /** The mark behind the cell; null when a reviewer added the cell. */
  opId: string | null;
  /** When that mark was made, as the phone showed it. */
  at: string | null;
  /** The mark a settlement replaced. */
  settledFrom: string | null;
  /** Did a reviewer decide the state? */
  settled: boolean;
}

/** The cell as its observer marked it. */
function markedCell({ q, r, state, nectar, unsure, reused, scrap, instar, note, opId, at }: Mark): ReadCell {
  return { q, r, state, nectar, unsure, reused, scrap, instar, note, opId, at, settledFrom: null, settled: false };
}

/** The live marks of a reading as cells, in the order given. */
export function markedCells(live: readonly Mark[]): ReadCell[] {
  return live.map(markedCell);
}

const UNMARKED = { nectar: false, unsure: false, reused: false, scrap: false, instar: null, note: null } as const;

/**
 * A cell after a decision. Nectar, reuse, prey and the note stay as marked; doubt and instar spoke about the old
 * state, so they go when the state changes. A cell that nobody can tell is unsure.
 */
function settledCell(settlement: CellSettlement, before: ReadCell | undefined): ReadCell {
  const { q, r, state, markOpId, pick } = settlement;
  const marked = before ?? { ...UNMARKED, opId: null, at: null, state: null };
  const kept = marked.state === state ? {} : { unsure: false, instar: null };
  const doubt = pick === 'unsure' ? { unsure: true } : {};
  return { ...marked, ...kept, ...doubt, q, r, state, settledFrom: markOpId, settled: true };
}

/**
 * The cells of a final reading: the live marks it was made from, overlaid by what reviewers decided.
 *
 * @param live the live marks of the reading it is based on.
 * @param settlements all decisions that count, any order.
 * @returns one cell an address, in walk order; a cell that was decided not to be there is left out.
 */
export function finalCells(live: readonly Mark[], settlements: readonly CellSettlement[]): ReadCell[] {
  const cells = new Map(live.map((mark) => [cellKey(mark), markedCell(mark)]));
  const base = new Map(cells);
  for (const settlement of [...settlements].sort((a, b) => a.position - b.position)) {
    const key = cellKey(settlement);
    if (settlement.pick === 'none') cells.delete(key);
    else cells.set(key, settledCell(settlement, base.get(key)));
  }
  return [...cells.values()].sort(byWalkOrder);
}
