import type { Chain } from './chain';

/** A day on which something is asked or seen; `likelihood` is null where nothing was seen. */
export interface Station {
  time: number;
  /** P(what was seen | state), by state. */
  likelihood: Float64Array | null;
}

/** Where the chain starts. */
export interface Start {
  time: number;
  mass: Float64Array;
}

/** The forward pass. */
interface Filtered {
  /** State probabilities at each station given everything up to it. */
  filtered: Float64Array[];
  /** Log-likelihood of everything seen; −∞ when it cannot have happened. */
  logLik: number;
}

function weigh(mass: Float64Array, likelihood: Float64Array | null): Float64Array {
  return likelihood ? mass.map((p, s) => p * (likelihood[s] ?? 0)) : mass;
}

function sumOf(values: Float64Array): number {
  return values.reduce((sum, value) => sum + value, 0);
}

/** Divides by the sum, so that a vector sums to 1; an empty one stays empty. */
export function normalised(values: Float64Array): Float64Array {
  const total = sumOf(values);
  return total > 0 ? values.map((value) => value / total) : values;
}

/**
 * Forward pass over stations in order of time, normalised at each, so that nothing underflows.
 */
export function filterForward(chain: Chain, start: Start, stations: readonly Station[]): Filtered {
  let { time, mass } = start;
  let logLik = 0;
  const filtered = stations.map((station) => {
    const seen = weigh(chain.forward(mass, { from: time, to: station.time }), station.likelihood);
    if (station.likelihood) logLik += Math.log(sumOf(seen));
    mass = normalised(seen);
    time = station.time;
    return mass;
  });
  return { filtered, logLik };
}

/**
 * Backward pass: for each station the value of every state, P(all that is seen later, and `terminal`) up to a factor.
 *
 * @param terminal value of each state after the last station: all ones, or 1 for the states that are asked about.
 */
export function valueBackward(chain: Chain, terminal: Float64Array, stations: readonly Station[]): Float64Array[] {
  const values: Float64Array[] = [];
  let value = terminal;
  let later: Station | undefined;
  for (const station of [...stations].reverse()) {
    if (later)
      value = normalised(chain.backward(weigh(value, later.likelihood), { from: station.time, to: later.time }));
    values.push(value);
    later = station;
  }
  return values.reverse();
}

/** State probabilities at each station given everything seen (and the terminal value). */
export function posterior(filtered: readonly Float64Array[], values: readonly Float64Array[]): Float64Array[] {
  return filtered.map((mass, i) => normalised(weigh(mass, values[i] ?? null)));
}
