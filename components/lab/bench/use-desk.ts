import { useState } from 'react';
import type { CombCellView } from '@/components/comb/comb-view';
import { type Axial, cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import { type Correction, reasonTrouble, withCorrection, withoutCorrection } from './correction';

/** What the reviewer is saying about the picked cell, not in the list yet. */
export interface Draft {
  cell: CombCellView;
  state: CellState | null;
  reason: string;
  /** What is missing, in words; shown once the reviewer tried to add it. */
  trouble: string | null;
}

/** The picked cell, the list, and what can be done with them. */
export interface Desk {
  draft: Draft | null;
  corrections: readonly Correction[];
  pick: (place: Axial) => void;
  choose: (state: CellState) => void;
  explain: (reason: string) => void;
  add: () => void;
  remove: (correction: Correction) => void;
  /** Empties the bench once the office has stored the list. */
  clear: () => void;
}

/** Is a cell of the list this one? */
export function isAt(cell: Axial): (candidate: Axial) => boolean {
  return (candidate) => cellKey(candidate) === cellKey(cell);
}

/** A draft put into the list, or what is missing from it. */
function correctionOf({ cell, state, reason }: Draft): Correction | string {
  if (state === null) return 'Choose the new state first.';
  return reasonTrouble(reason) ?? { q: cell.q, r: cell.r, was: cell.state, state, reason: reason.trim() };
}

/** Holds what is on the bench until it is stored. @param cells the reading as the office has it. */
export function useDesk(cells: readonly CombCellView[]): Desk {
  const [draft, setDraft] = useState<Draft | null>(null);
  const [corrections, setCorrections] = useState<readonly Correction[]>([]);
  const pick = (place: Axial): void => {
    const cell = cells.find(isAt(place));
    const listed = corrections.find(isAt(place));
    setDraft(cell ? { cell, state: listed?.state ?? null, reason: listed?.reason ?? '', trouble: null } : null);
  };
  const add = (): void => {
    if (!draft) return;
    const correction = correctionOf(draft);
    const isMissingSomething = typeof correction === 'string';
    if (!isMissingSomething) setCorrections(withCorrection(corrections, correction));
    setDraft({ ...draft, trouble: isMissingSomething ? correction : null });
  };
  return {
    draft,
    corrections,
    pick,
    choose: (state) => setDraft(draft && { ...draft, state }),
    explain: (reason) => setDraft(draft && { ...draft, reason }),
    add,
    remove: (correction) => setCorrections(withoutCorrection(corrections, correction)),
    clear: () => {
      setDraft(null);
      setCorrections([]);
    },
  };
}
