import { byKey, isOccupied } from './brood-states';
import type { CellModel } from './cell-model';
import { normalised } from './stations';

/** What becomes of the brood now in the cell, by days after the last visit. */
export interface BroodOutlook {
  daysAfter: readonly number[];
  /** Capped by then, whatever became of it later. */
  capped: number[];
  /** The adult has come out. */
  emerged: number[];
  /** Lost. */
  removed: number[];
}

/** Adds up the probabilities of the kinds whose key begins with one of the given words. */
function sumKinds(kinds: Record<string, number>, words: readonly string[]): number {
  return Object.entries(kinds)
    .filter(([key]) => words.some((word) => key.startsWith(`${word}#`)))
    .reduce((sum, [, p]) => sum + p, 0);
}

/**
 * Follows the present brood, given that the cell is occupied at the last visit. Laying is switched off, so that an
 * empty cell stays empty.
 *
 * @param last state probabilities at the last visit; null is answered when the cell cannot be occupied.
 */
export function broodOutlook(
  { states, broodChain }: CellModel,
  last: { time: number; mass: Float64Array },
  daysAfter: readonly number[],
): BroodOutlook | null {
  const living = last.mass.map((p, s) => (isOccupied(states.keys[s] ?? '') ? p : 0));
  if (living.every((p) => p === 0)) return null;
  const start = normalised(living);
  const cappedStage = states.stages.at(-1)?.name ?? '';
  const kinds = daysAfter.map((days) =>
    byKey(states, broodChain.forward(start, { from: last.time, to: last.time + days })),
  );
  return {
    daysAfter,
    capped: kinds.map((kind) => sumKinds(kind, [cappedStage, 'EM', 'RMp'])),
    emerged: kinds.map((kind) => sumKinds(kind, ['EM'])),
    removed: kinds.map((kind) => sumKinds(kind, ['RMe', 'RMl', 'RMp'])),
  };
}
