import { type Blocks, addScaled, blocksOf } from '@/lib/brood/hmm/uniformised';
import type { BuildingPrior } from './building';
import { NEW_CELL } from './brood-model';
import { LEAST, type NestKernel } from './nest-kernel';
import type { Segment } from './timeline';

/** What cells built within a segment come to: per unit of the prior, as if nothing had been seen. */
export interface Newcomers {
  /** State masses at the end of the segment. */
  end: Float64Array;
  used: Blocks;
  /** First egg laid, later egg laid, brood capped, by step. */
  first: Float64Array;
  later: Float64Array;
  capping: Float64Array;
}

/** First eggs by step, and what is still without one at the end: building in mid-step, then a constant hazard. */
export function firstEggs(
  built: Float64Array,
  { layFirst, step, waiting }: { layFirst: number; step: number; waiting: number },
): { laid: Float64Array; waiting: number } {
  const [whole, half] = [Math.exp(-layFirst * step), Math.exp((-layFirst * step) / 2)];
  let left = waiting;
  const laid = built.map((mass) => {
    const now = left * (1 - whole) + mass * (1 - half);
    left = left * whole + mass * half;
    return now;
  });
  return { laid, waiting: left };
}

/** Adds up flows of broods laid in earlier steps: `flow[k]` is per day, k steps after laying. */
function convolve(laid: Float64Array, flow: Float64Array, step: number): Float64Array {
  const sum = new Float64Array(laid.length);
  laid.forEach((mass, i) => {
    if (mass < LEAST) return;
    const weight = mass * step;
    for (let j = i + 1; j < sum.length; j++) sum[j] = (sum[j] ?? 0) + weight * (flow[j - i] ?? 0);
  });
  return sum;
}

/** Mixes the rows of an egg over the times it may have been laid at, seen from the end of the segment. */
function mixedRows(kernel: NestKernel, segment: Segment, laid: Float64Array): { end: Float64Array; used: Blocks } {
  const { days, steps, rate } = segment;
  const { clock } = kernel.full(rate);
  const weights: number[] = [];
  laid.forEach((mass, i) => {
    if (mass < LEAST) return;
    const { first, weights: ticks } = kernel.weightsOf((clock * days * (steps - i - 0.5)) / steps);
    for (let n = weights.length; n < first + ticks.length; n++) weights.push(0);
    for (let n = 0; n < ticks.length; n++) weights[first + n] = (weights[first + n] ?? 0) + mass * (ticks[n] ?? 0);
  });
  const { rows, blocks, chain } = kernel.eggRows(rate, weights.length);
  const end = new Float64Array(chain.states);
  const used = blocksOf(chain, 0);
  weights.forEach((weight, n) => {
    const [row, active] = [rows[n], blocks[n]];
    if (weight < LEAST || !row || !active) return;
    addScaled(end, { vector: row, weight }, active);
    active.forEach((is, b) => {
      if (is === 1) used[b] = 1;
    });
  });
  return { end, used };
}

/** Follows the cells built in a segment to its end. */
export function newcomersOf(
  kernel: NestKernel,
  segment: Segment,
  { mass, firstStep }: { mass: BuildingPrior['mass']; firstStep: number },
): Newcomers {
  const step = segment.days / segment.steps;
  const built = mass.subarray(firstStep, firstStep + segment.steps);
  const { laid, waiting } = firstEggs(Float64Array.from(built), { layFirst: kernel.model.layFirst, step, waiting: 0 });
  const { relaid, capping } = kernel.eggFlows(segment);
  const { end, used } = mixedRows(kernel, segment, laid);
  end[NEW_CELL] = (end[NEW_CELL] ?? 0) + waiting;
  used[0] = 1;
  return { end, used, first: laid, later: convolve(laid, relaid, step), capping: convolve(laid, capping, step) };
}
