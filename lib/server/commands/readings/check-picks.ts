import 'server-only';
import { cellKey } from '@/lib/comb/axial';
import { HttpProblem } from '@/lib/server/http/problem';
import type { Comparison } from '@/lib/server/queries/review/comparison';
import type { SettleInput } from './settle-input';

type PickedCell = SettleInput['cells'][number];

/** Does the state fit whose view is said to be taken? */
function fits({ pick, state, ...place }: PickedCell, comparison: Comparison): boolean {
  const pair = comparison.pairs.find((known) => cellKey(known) === cellKey(place));
  if (pick === 'field' || pick === 'lab') return pair?.[pick]?.state === state;
  if (pick === 'unsure' || pick === 'none') return state === 'unread';
  return true;
}

/**
 * Makes sure that whoever is named in a decision has really seen that.
 *
 * @param comparison null without a second reading: then nobody can be picked.
 * @throws HttpProblem `pick`.
 */
export function checkPicks(cells: readonly PickedCell[], comparison: Comparison | null): void {
  for (const cell of cells) {
    if (cell.pick && (!comparison || !fits(cell, comparison))) throw new HttpProblem('pick');
  }
}
