import { type CellModel } from './cell-model';
import { type Pass, type TimedFlow, layingFlow } from './laying-flow';
import type { Station } from './stations';

/** P(laid by each time), given everything seen. */
export interface LayingLaw {
  times: readonly number[];
  /** The first egg ever laid in the cell. */
  first: Float64Array;
  /** The egg of the brood now in the cell; null when there cannot be one. */
  current: Float64Array | null;
}

/** Days between two times at which a laying law is worked out, besides the times of the visits. */
export const LAYING_STEP = 0.25;

/** The times from the start to the last visit in steps of `step`, the start included. */
export function regularTimes(visits: readonly Station[], start: number, step: number): number[] {
  const end = visits.at(-1)?.time ?? start;
  return Array.from({ length: Math.floor((end - start) / step + 1e-9) + 1 }, (_, i) => start + i * step);
}

function dot(a: Float64Array, b: Float64Array): number {
  return a.reduce((sum, value, i) => sum + value * (b[i] ?? 0), 0);
}

/** Weights of the generations, given that the cell is occupied at the last visit; null when it cannot be. */
export function generationWeights({ states }: CellModel, last: Float64Array): number[] | null {
  const occupied = Array.from({ length: states.generations }, (_, g) => dot(last, states.occupied(g + 1)));
  const total = occupied.reduce((sum, p) => sum + p, 0);
  return total > 0 ? occupied.map((p) => p / total) : null;
}

/** P(no egg ever yet) at the moments of a stretch: the states before the first egg, as seen from both sides. */
function stillUnlaid({ moments, unlaidMass, unlaidValue, scale }: Pass): number[] {
  return moments.map((_, i) => {
    const both = unlaidMass.reduce((sum, mass, k) => sum + (mass[i] ?? 0) * (unlaidValue[k]?.[i] ?? 0), 0);
    return Math.exp(scale) * both;
  });
}

/** P(the present brood is laid after each moment): the flow of laying, added up from the last visit backwards. */
function laidAfter(flows: readonly TimedFlow[], times: readonly number[]): Float64Array {
  const after = new Float64Array(times.length);
  let i = times.length - 1;
  let sum = 0;
  for (const { at, mass } of [...flows].sort((a, b) => b.at - a.at)) {
    while (i >= 0 && (times[i] ?? 0) > at) after[i--] = sum;
    sum += mass;
  }
  while (i >= 0) after[i--] = sum;
  return after;
}

/**
 * When the first egg and the egg of the present brood were laid. The first egg: by the states before it, which a cell
 * never comes back to. The present brood: by the flow into the egg, each moment weighed by the chance that a brood laid
 * then gives all later records and lives.
 *
 * @param visits in order of time.
 * @param times further times to work the laws out at, none before the start or after the last visit.
 */
export function layingLaw(model: CellModel, visits: readonly Station[], times: readonly number[]): LayingLaw {
  const moments = [...new Set([...times, ...visits.map(({ time }) => time)])].sort((a, b) => a - b);
  const { passes, flows, occupied } = layingFlow(model, visits, moments);
  const unlaid = passes.flatMap(stillUnlaid);
  const first = Float64Array.from(moments, (_, i) => 1 - Math.min(1, unlaid[i] ?? 1));
  const current = occupied ? laidAfter(flows, moments).map((after) => Math.min(1, Math.max(0, 1 - after))) : null;
  return { times: moments, first, current };
}

/**
 * The time by which a law reaches `p`, linear between its times. A law that does not reach `p` by the last visit has
 * no such time before it; the last visit stands for "not before".
 */
export function quantileTime(times: readonly number[], cdf: Float64Array, p: number): number {
  const i = cdf.findIndex((value) => value >= p);
  if (i < 0) return times.at(-1) ?? NaN;
  if (i === 0) return times[0] ?? NaN;
  const [low, high] = [cdf[i - 1] ?? 0, cdf[i] ?? 1];
  const [before, after] = [times[i - 1] ?? NaN, times[i] ?? NaN];
  return before + ((p - low) / (high - low)) * (after - before);
}
