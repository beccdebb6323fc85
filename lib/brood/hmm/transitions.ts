/**
 * The moves a continuous-time Markov chain can make. Each move has one rate for every clock, and the clocks run at
 * speeds that change in steps: the generator on a day is the sum over clocks of speed × rates.
 */
export interface Transitions {
  states: number;
  source: Int32Array;
  target: Int32Array;
  /** `rates[clock][move]`, per day of that clock. */
  rates: readonly Float64Array[];
}

/** One move, driven by one clock. */
export interface Move {
  source: number;
  target: number;
  clock: number;
  rate: number;
}

/** The speeds of all clocks from one day on, until the next piece begins. */
export interface SpeedPiece {
  from: number;
  speeds: readonly number[];
}

/** Collects moves into one table; equal pairs of states share a row. */
export function transitions(states: number, clocks: number, moves: readonly Move[]): Transitions {
  const pairs = new Map<number, number[]>();
  for (const { source, target, clock, rate } of moves) {
    const key = source * states + target;
    const rates = pairs.get(key) ?? Array<number>(clocks).fill(0);
    rates[clock] = (rates[clock] ?? 0) + rate;
    pairs.set(key, rates);
  }
  const rows = [...pairs].sort(([a], [b]) => a - b);
  return {
    states,
    source: Int32Array.from(rows, ([key]) => Math.floor(key / states)),
    target: Int32Array.from(rows, ([key]) => key % states),
    rates: Array.from({ length: clocks }, (_, clock) => Float64Array.from(rows, ([, rates]) => rates[clock] ?? 0)),
  };
}

/** The moves within the states `from` … `to − 1`, which are numbered anew from 0. */
export function sliceMoves(all: Transitions, from: number, to: number): Transitions {
  const isIn = (state: number | undefined) => state !== undefined && state >= from && state < to;
  const kept = Array.from(all.source.keys()).filter((i) => isIn(all.source[i]) && isIn(all.target[i]));
  return {
    states: to - from,
    source: Int32Array.from(kept, (i) => (all.source[i] ?? 0) - from),
    target: Int32Array.from(kept, (i) => (all.target[i] ?? 0) - from),
    rates: all.rates.map((rates) => Float64Array.from(kept, (i) => rates[i] ?? 0)),
  };
}
