import { type Axial, cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import { byWalkOrder } from '@/lib/comb/walk';

/** A reviewer's decision about one cell, not stored yet. */
export interface Correction extends Axial {
  /** The state shown before; for the reviewer's eyes only. */
  was: CellState;
  state: CellState;
  reason: string;
}

/** The longest reason the office takes, in code points. */
const LONGEST_REASON = 10_000;

/** Why a reason can't be taken, in words; null when it can. */
export function reasonTrouble(reason: string): string | null {
  const length = [...reason.trim()].length;
  if (length === 0) return 'Say why: the person who marked the cell will read it.';
  if (length > LONGEST_REASON) return `The reason has ${length} characters; at most ${LONGEST_REASON} are kept.`;
  return null;
}

/** The list with this correction in it, one a cell, in walk order; a second one for a cell replaces the first. */
export function withCorrection(list: readonly Correction[], correction: Correction): Correction[] {
  return [...withoutCorrection(list, correction), correction].sort(byWalkOrder);
}

/** The list without the correction of a cell. */
export function withoutCorrection(list: readonly Correction[], cell: Axial): Correction[] {
  return list.filter((correction) => cellKey(correction) !== cellKey(cell));
}
