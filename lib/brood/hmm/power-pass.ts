import { type PoissonWeights, poissonMean, poissonWeights } from '@/lib/brood/poisson';
import {
  BLOCK,
  type Blocks,
  type Uniformised,
  addScaled,
  blocksOf,
  heldBlocks,
  reachFrom,
  tickMass,
  tickValue,
} from './uniformised';

/** A weighted sum of a vector that is followed through a pass: pairs of state and weight. */
export type Gate = readonly (readonly [state: number, weight: number])[];

/** What a pass is asked for. */
export interface PassRequest {
  days: number;
  /** Sums to follow, each at times of its own, counted in days from where the pass begins. */
  watch?: readonly { gate: Gate; at: Float64Array }[];
  /** Poisson weights by mean, where many passes share them. */
  weightsOf?: (mean: number) => PoissonWeights;
  /** A block of states that holds no more than this in any of them is taken as empty. */
  least?: number;
}

/** Where a pass ends, the watched sums at their times, and the blocks of states that were used on the way. */
export interface PassResult {
  end: Float64Array;
  watched: Float64Array[];
  used: Blocks;
}

/** The value of a gate. */
export function gateValue(gate: Gate, vector: Float64Array): number {
  let sum = 0;
  for (const [state, weight] of gate) sum += weight * (vector[state] ?? 0);
  return sum;
}

/** Follows the watched sums tick by tick. */
function recorder(watch: NonNullable<PassRequest['watch']>, ticks: number) {
  const sequences = watch.map(() => new Float64Array(ticks));
  const note = (n: number, vector: Float64Array): void => {
    for (let i = 0; i < watch.length; i++) {
      const sequence = sequences[i];
      if (sequence) sequence[n] = gateValue(watch[i]?.gate ?? [], vector);
    }
  };
  return { sequences, note };
}

function standing(vector: Float64Array, watch: NonNullable<PassRequest['watch']>, used: Blocks): PassResult {
  const watched = watch.map(({ gate, at }) => new Float64Array(at.length).fill(gateValue(gate, vector)));
  return { end: vector.slice(), watched, used };
}

/** The blocks in play: for masses they follow the mass, looked at anew before it can have crossed a block. */
function moving(chain: Uniformised, { vector, least }: { vector: Float64Array; least: number }) {
  let blocks = blocksOf(chain, 1);
  const used = blocksOf(chain, 0);
  return {
    used,
    at(n: number, current: Float64Array, next: Float64Array): Blocks {
      if (n % (BLOCK / 2) !== 0) return blocks;
      const before = blocks;
      const held = blocks.slice();
      heldBlocks(n === 0 ? vector : current, held, { least });
      blocks = reachFrom(chain, held);
      before.forEach((was, b) => {
        if (was === 1 && blocks[b] === 0) next.fill(0, b * BLOCK, (b + 1) * BLOCK);
      });
      blocks.forEach((is, b) => {
        if (is === 1) used[b] = 1;
      });
      return blocks;
    },
  };
}

/** Turns sequences by tick into values at the watched times. */
function atTimes(
  chain: Uniformised,
  sequences: readonly Float64Array[],
  { watch = [], weightsOf = poissonWeights }: PassRequest,
): Float64Array[] {
  return sequences.map((sequence, i) =>
    (watch[i]?.at ?? new Float64Array(0)).map((time) => poissonMean(sequence, weightsOf(chain.clock * time))),
  );
}

/**
 * Carries masses forward through a time with constant speeds, and reads sums of them at any number of moments on the
 * way: the vector after 0, 1, 2, … ticks is worked out once and serves all of them, each with its own Poisson weights.
 */
export function massPass(chain: Uniformised, mass: Float64Array, request: PassRequest): PassResult {
  const { days, watch = [], weightsOf = poissonWeights, least = 0 } = request;
  if (days === 0 || chain.clock === 0) return standing(mass, watch, blocksOf(chain, 1));
  const { first, weights } = weightsOf(chain.clock * days);
  const ticks = first + weights.length;
  const { sequences, note } = recorder(watch, ticks);
  const end = new Float64Array(mass.length);
  let [current, next] = [mass.slice(), new Float64Array(mass.length)];
  const play = moving(chain, { vector: current, least });
  let blocks = play.at(0, current, next);
  for (let n = 0; n < ticks; n++) {
    if (n > 0) {
      tickMass(chain, { current, next }, blocks);
      [current, next] = [next, current];
      blocks = play.at(n, current, next);
    }
    note(n, current);
    if (n >= first) addScaled(end, { vector: current, weight: weights[n - first] ?? 0 }, blocks);
  }
  return { end, watched: atTimes(chain, sequences, request), used: play.used };
}

/**
 * Carries values backward, like `massPass`; watched times count backwards from where the values are known.
 *
 * @param blocks the states whose values are asked for and all that they can pass through; others count as 0.
 */
export function valuePass(
  chain: Uniformised,
  value: Float64Array,
  { blocks = blocksOf(chain, 1), ...request }: PassRequest & { blocks?: Blocks },
): PassResult {
  const { days, watch = [], weightsOf = poissonWeights } = request;
  if (days === 0 || chain.clock === 0) return standing(value, watch, blocks);
  const { first, weights } = weightsOf(chain.clock * days);
  const ticks = first + weights.length;
  const { sequences, note } = recorder(watch, ticks);
  const end = new Float64Array(value.length);
  let [current, next] = [value.slice(), new Float64Array(value.length)];
  blocks.forEach((isIn, b) => {
    if (isIn === 0) current.fill(0, b * BLOCK, (b + 1) * BLOCK);
  });
  for (let n = 0; n < ticks; n++) {
    if (n > 0) {
      tickValue(chain, { current, next }, blocks);
      [current, next] = [next, current];
    }
    note(n, current);
    if (n >= first) addScaled(end, { vector: current, weight: weights[n - first] ?? 0 }, blocks);
  }
  return { end, watched: atTimes(chain, sequences, request), used: blocks };
}
