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

/** Adds the generations of a state vector up into the states of one brood; only living brood counts. */
function presentBrood({ states, broodOffset, broodLiving }: CellModel, mass: Float64Array): Float64Array {
  const size = broodLiving.length;
  return broodLiving.map((isLiving, s) => {
    let sum = 0;
    for (let g = 0; g < states.generations; g++) sum += mass[broodOffset + g * size + s] ?? 0;
    return isLiving * sum;
  });
}

/**
 * Follows the present brood, given that the cell is occupied at the last visit. Laying is switched off, so that an
 * empty cell stays empty.
 *
 * @param last state probabilities at the last visit; null is answered when the cell cannot be occupied.
 */
export function broodOutlook(
  model: CellModel,
  last: { time: number; mass: Float64Array },
  daysAfter: readonly number[],
): BroodOutlook | null {
  const living = presentBrood(model, last.mass);
  if (living.every((p) => p === 0)) return null;
  const start = normalised(living);
  const { states, brood, broodOffset } = model;
  const ends = states.ends(0);
  const at = daysAfter.map((days) => brood.forward(start, { from: last.time, to: last.time + days }));
  const sum = (mass: Float64Array, from: number, to: number) =>
    mass.subarray(from - broodOffset, to - broodOffset).reduce((all, p) => all + p, 0);
  const end = (mass: Float64Array, state: number) => mass[state - broodOffset] ?? 0;
  const pupa = states.phase(0, states.stages.length - 1);
  return {
    daysAfter,
    capped: at.map((mass) => sum(mass, pupa, ends.emerged + 1) + end(mass, ends.lostCapped)),
    emerged: at.map((mass) => end(mass, ends.emerged)),
    removed: at.map((mass) => sum(mass, ends.lostEgg, ends.lostCapped + 1)),
  };
}
