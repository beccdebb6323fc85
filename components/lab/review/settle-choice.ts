import { reasonTrouble } from '@/components/lab/bench/correction';
import { type CellState, STATE_WORDS } from '@/lib/comb/states';
import type { SettlePick } from '@/lib/comb/settle-pick';
import type { PairRow } from './review-shapes';

/** One way to settle a cell, as the reviewer is offered it. */
export interface SettleOption {
  pick: SettlePick;
  /** The state the cell gets; null where the reviewer has to name a third one. */
  state: CellState | null;
  words: string;
}

/** What a reviewer is saying about one cell, not stored yet. */
export interface SettleDraft {
  pick: SettlePick | null;
  /** Used with a third state only. */
  third: CellState | null;
  reason: string;
}

/** A draft in which nothing is said. */
export const EMPTY_DRAFT: SettleDraft = { pick: null, third: null, reason: '' };

/** What the office is sent about one cell. */
export interface SettledCell {
  q: number;
  r: number;
  state: CellState;
  reason: string;
  pick: SettlePick;
}

/** The ways to settle a cell: each reader's view, a third state, that nobody can tell, or that there is no cell. */
export function settleOptions({ field, lab }: PairRow): SettleOption[] {
  const options: SettleOption[] = [];
  if (field) options.push({ pick: 'field', state: field.state, words: `field: ${STATE_WORDS[field.state]}` });
  if (lab) options.push({ pick: 'lab', state: lab.state, words: `lab: ${STATE_WORDS[lab.state]}` });
  if (!field || !lab) options.push({ pick: 'none', state: 'unread', words: 'there is no such cell' });
  options.push({ pick: 'unsure', state: 'unread', words: 'nobody can tell' });
  options.push({ pick: 'third', state: null, words: 'a third state' });
  return options;
}

/** The draft as it is sent, or what is missing from it, in words. */
export function settledCell(pair: PairRow, { pick, third, reason }: SettleDraft): SettledCell | string {
  const option = settleOptions(pair).find((candidate) => candidate.pick === pick);
  if (!option) return 'Choose whose view is taken first.';
  const state = option.state ?? third;
  if (state === null) return 'Choose the third state.';
  return reasonTrouble(reason) ?? { q: pair.q, r: pair.r, state, reason: reason.trim(), pick: option.pick };
}
