import type { PhaseChain } from './phase-chain';
import { tick } from './phase-chain';

/** The question a passage answers: mass `start` is let go at 0; `arrived` says how much of each phase counts as there. */
interface Passage {
  /** One entry a phase. */
  start: Float64Array;
  /** One entry a phase and a last one for the end of the chain. */
  arrived: Float64Array;
}

/** Past this the rest of a law is not followed. */
const COMPLETE = 1 - 1e-13;

/** No law in use needs more ticks; a chain that does is cut here rather than run for ever. */
const MOST_TICKS = 50_000;

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += (a[i] ?? 0) * (b[i] ?? 0);
  return sum;
}

/**
 * Follows a passage tick by tick of the uniformised chain.
 *
 * @returns the probability of having arrived after 0, 1, 2, … ticks, ending with 1.
 */
function passageByTick(chain: PhaseChain, { start, arrived }: Passage): Float64Array {
  const mass = new Float64Array(chain.rates.length + 1);
  mass.set(start);
  const values: number[] = [];
  for (let value = dot(mass, arrived); value < COMPLETE && values.length < MOST_TICKS; value = dot(mass, arrived)) {
    values.push(value);
    tick(chain, mass);
  }
  return Float64Array.from([...values, 1]);
}

/** The passage from `start` to beyond phase `end − 1`. */
export function passageTo(chain: PhaseChain, start: Float64Array, end: number): Float64Array {
  const arrived = Float64Array.from({ length: chain.rates.length + 1 }, (_, i) => (i >= end ? 1 : 0));
  return passageByTick(chain, { start, arrived });
}

/**
 * The time already spent since phase `from` was entered, seen in the phases of `weights`: the whole of the phases
 * before, and an exponential part of the present one (memoryless, so the time spent in it has its own law).
 */
export function passageSince(chain: PhaseChain, from: number, weights: Float64Array): Float64Array {
  const start = new Float64Array(chain.rates.length);
  start[from] = 1;
  const arrived = new Float64Array(chain.rates.length + 1);
  for (let i = 0; i < chain.rates.length; i++) arrived[i + 1] = (arrived[i] ?? 0) + (weights[i] ?? 0);
  return passageByTick(chain, { start, arrived });
}
