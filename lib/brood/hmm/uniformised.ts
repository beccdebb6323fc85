import { poissonWeights } from '@/lib/brood/poisson';
import type { Transitions } from './transitions';

/**
 * A generator as a discrete chain with Poisson ticks: v·exp(Q t) = Σ Poisson(n; clock · t) · v (I + Q / clock)ⁿ.
 * All terms are non-negative, so nothing cancels.
 */
export interface Uniformised {
  moves: Transitions;
  /** Ticks a day: the largest rate of leaving any state. */
  clock: number;
  /** Probability of staying at a tick, by state. */
  stay: Float64Array;
  /** Probability of each move at a tick. */
  go: Float64Array;
}

/** The generator at given speeds of the clocks, uniformised. */
export function uniformise(moves: Transitions, speeds: readonly number[]): Uniformised {
  const go = new Float64Array(moves.source.length);
  moves.rates.forEach((rates, clock) => {
    const speed = speeds[clock] ?? 0;
    for (let i = 0; i < go.length; i++) go[i] = (go[i] ?? 0) + speed * (rates[i] ?? 0);
  });
  const leave = new Float64Array(moves.states);
  go.forEach((rate, i) => {
    const source = moves.source[i] ?? 0;
    leave[source] = (leave[source] ?? 0) + rate;
  });
  const clock = leave.reduce((most, rate) => Math.max(most, rate), 0);
  if (clock === 0) return { moves, clock, stay: leave.fill(1), go };
  return { moves, clock, stay: leave.map((rate) => 1 - rate / clock), go: go.map((rate) => rate / clock) };
}

/** One tick of a row of masses: `next = mass (I + Q / clock)`. */
function tickMass({ moves, stay, go }: Uniformised, mass: Float64Array, next: Float64Array): void {
  const { source, target } = moves;
  for (let s = 0; s < next.length; s++) next[s] = (mass[s] ?? 0) * (stay[s] ?? 0);
  for (let i = 0; i < go.length; i++) {
    const to = target[i] ?? 0;
    next[to] = (next[to] ?? 0) + (mass[source[i] ?? 0] ?? 0) * (go[i] ?? 0);
  }
}

/** One tick of a column of values: `next = (I + Q / clock) value`. */
function tickValue({ moves, stay, go }: Uniformised, value: Float64Array, next: Float64Array): void {
  const { source, target } = moves;
  for (let s = 0; s < next.length; s++) next[s] = (value[s] ?? 0) * (stay[s] ?? 0);
  for (let i = 0; i < go.length; i++) {
    const from = source[i] ?? 0;
    next[from] = (next[from] ?? 0) + (value[target[i] ?? 0] ?? 0) * (go[i] ?? 0);
  }
}

type Tick = typeof tickMass;

function poissonSum(
  chain: Uniformised,
  vector: Float64Array,
  { days, tick }: { days: number; tick: Tick },
): Float64Array {
  if (days === 0 || chain.clock === 0) return vector.slice();
  const { first, weights } = poissonWeights(chain.clock * days);
  const sum = new Float64Array(vector.length);
  let [current, next] = [vector.slice(), new Float64Array(vector.length)];
  for (let n = 0; n < first + weights.length; n++) {
    if (n > 0) {
      tick(chain, current, next);
      [current, next] = [next, current];
    }
    const weight = n < first ? 0 : (weights[n - first] ?? 0);
    if (weight > 0) for (let s = 0; s < sum.length; s++) sum[s] = (sum[s] ?? 0) + weight * (current[s] ?? 0);
  }
  return sum;
}

/** Masses after `days`: `mass · exp(Q days)`. */
export function massAfter(chain: Uniformised, mass: Float64Array, days: number): Float64Array {
  return poissonSum(chain, mass, { days, tick: tickMass });
}

/** Expected values `days` before: `exp(Q days) · value`. */
export function valueBefore(chain: Uniformised, value: Float64Array, days: number): Float64Array {
  return poissonSum(chain, value, { days, tick: tickValue });
}
