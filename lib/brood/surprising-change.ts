import type { CellState } from '@/lib/comb/states';
import { type StageDays, stagePlaces } from './stage-places';

/** What one cell held at two looks, and the days between them. */
export interface CellChange {
  from: CellState;
  to: CellState;
  days: number;
}

/**
 * Why a change is asked about: `younger`, the brood is younger than the one seen before and hardly had time to take its
 * place; `fast`, it is further on than the days allow.
 */
export type Surprise = 'younger' | 'fast';

/** Brood this much faster than the mean is asked about. */
const FASTEST = 0.5;
/** A cap is not expected to be left, cleaned out and laid in again within this many days. */
const DAYS_TO_REUSE = 7;
/** Nor a larva to be lost and an egg to take its place within this many. */
const DAYS_TO_RELAY = 2;

const WITHOUT_BROOD: ReadonlySet<CellState> = new Set(['empty', 'opened', 'dead', 'parasitised']);

/** Is the later sight younger, and too soon for another brood? */
function isTooYoung({ from, days }: CellChange, startOfLater: number): boolean {
  const toLayAgain = from === 'capped' ? DAYS_TO_REUSE : DAYS_TO_RELAY;
  return days < toLayAgain + FASTEST * startOfLater;
}

/**
 * Judges a change against what can happen in the days between. It only finds what is worth asking: every change can be
 * recorded.
 *
 * @param durations mean stage durations of the nest's taxon in days.
 * @returns null when there is nothing to ask.
 */
export function surprisingChange(change: CellChange, durations: StageDays): Surprise | null {
  const places = stagePlaces(durations);
  const place = (state: CellState) => places.find((candidate) => candidate.state === state);
  const later = place(change.to);
  if (!later) return null;
  if (WITHOUT_BROOD.has(change.from)) {
    const isNew = change.to !== 'opened' || change.from === 'empty';
    return isNew && change.days < FASTEST * later.from ? 'fast' : null;
  }
  const earlier = place(change.from);
  if (!earlier || later.state === earlier.state) return null;
  if (later.from < earlier.from) return isTooYoung(change, later.from) ? 'younger' : null;
  return change.days < FASTEST * (later.from - earlier.to) ? 'fast' : null;
}
