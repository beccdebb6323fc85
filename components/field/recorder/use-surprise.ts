'use client';

import { useState } from 'react';
import type { Expectation } from '@/components/field/brood/use-expectation';
import { surprisingChange } from '@/lib/brood/surprising-change';
import { type Axial, cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import type { RecorderView } from '@/lib/offline/recorder-view';
import type { Surprising } from './surprise-sheet';

type Judged = Pick<Expectation, 'durations' | 'daysSince'>;

/** What is surprising about a mark, against the last visit; null when nothing is. */
export function surpriseAt(
  cell: Axial & { state: CellState },
  last: RecorderView['last'],
  { durations, daysSince }: Judged,
): Surprising | null {
  const from = last.get(cellKey(cell))?.state;
  if (!from || daysSince === null) return null;
  const change = { from, to: cell.state, days: daysSince };
  const surprise = surprisingChange(change, durations);
  return surprise && { cell: { q: cell.q, r: cell.r }, change, surprise };
}

/** Notices marks that hardly fit the last visit, one at a time. */
export function useSurprise({ last }: RecorderView, judged: Judged) {
  const [surprising, setSurprising] = useState<Surprising | null>(null);
  const marked = (cell: Axial, state: CellState): void => setSurprising(surpriseAt({ ...cell, state }, last, judged));
  return { surprising, marked, answered: () => setSurprising(null) };
}
