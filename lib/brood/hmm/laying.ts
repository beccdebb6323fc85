import { type CellModel } from './cell-model';
import { stateSet } from './brood-states';
import { type Station, filterForward, normalised, posterior, valueBackward } from './stations';

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

/** The visits with further times between them, in order; a time of a visit is not repeated. */
function withTimes(visits: readonly Station[], times: readonly number[]): Station[] {
  const taken = new Set(visits.map(({ time }) => time));
  const further = times.filter((time) => !taken.has(time)).map((time) => ({ time, likelihood: null }));
  return [...visits, ...further].sort((a, b) => a.time - b.time);
}

function dot(a: Float64Array, b: Float64Array): number {
  return a.reduce((sum, value, i) => sum + value * (b[i] ?? 0), 0);
}

/** P(generation g was laid by each station), when the cell is in one of the `terminal` states at the end. */
function laidBy(
  { chain, states }: CellModel,
  { stations, filtered }: { stations: readonly Station[]; filtered: readonly Float64Array[] },
  { generation, terminal }: { generation: number; terminal: Float64Array },
): Float64Array {
  const laid = stateSet(states, (_, g) => g >= generation);
  const values = valueBackward(chain, terminal, stations);
  return Float64Array.from(posterior(filtered, values), (mass) => dot(mass, laid));
}

/** Weights of the generations, given that the cell is occupied at the last visit; null when it cannot be. */
export function generationWeights({ states }: CellModel, last: Float64Array): number[] | null {
  const occupied = Array.from({ length: states.generations }, (_, g) => dot(last, states.occupied(g + 1)));
  const total = occupied.reduce((sum, p) => sum + p, 0);
  return total > 0 ? occupied.map((p) => p / total) : null;
}

/** Generations less likely than this are left out of the law of the present brood: they cannot move it. */
const NEGLIGIBLE = 1e-15;

/**
 * When the first egg and the egg of the present brood were laid. For the present brood each generation has its own
 * backward pass, ending in the states where that generation lives.
 *
 * @param visits in order of time.
 * @param times further times to work the laws out at, none before the start or after the last visit.
 */
export function layingLaw(model: CellModel, visits: readonly Station[], times: readonly number[]): LayingLaw {
  const stations = withTimes(visits, times);
  const { filtered } = filterForward(model.chain, model.start, stations);
  const pass = { stations, filtered };
  const everything = new Float64Array(model.states.count).fill(1);
  const first = laidBy(model, pass, { generation: 1, terminal: everything });
  const weights = generationWeights(model, filtered.at(-1) ?? normalised(model.start.mass));
  const current = weights && new Float64Array(stations.length);
  weights?.forEach((weight, g) => {
    if (weight < NEGLIGIBLE) return;
    const law = laidBy(model, pass, { generation: g + 1, terminal: model.states.occupied(g + 1) });
    law.forEach((p, i) => {
      if (current) current[i] = (current[i] ?? 0) + weight * p;
    });
  });
  return { times: stations.map(({ time }) => time), first, current };
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
