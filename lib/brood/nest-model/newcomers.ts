import { type Blocks, addScaled, blocksOf, joinBlocks } from '@/lib/brood/hmm/uniformised';
import type { BuildingPrior } from './building';
import { NEW_CELL } from './brood-model';
import { LEAST, type NestKernel } from './nest-kernel';
import type { Segment } from './timeline';

/** What cells built within a segment come to: per unit of the prior, as if nothing had been seen. */
export interface Newcomers {
  /** State masses at the end of the segment. */
  end: Float64Array;
  used: Blocks;
  /** First eggs laid by step. */
  first: Float64Array;
  /** Later eggs laid and brood capped by step, worked out when asked for. */
  later: () => Float64Array;
  capping: () => Float64Array;
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
  const first = flow.findIndex((perDay) => perDay > LEAST);
  if (first < 0) return sum;
  for (let i = 0; i < laid.length; i++) {
    const weight = (laid[i] ?? 0) * step;
    if (weight < LEAST) continue;
    for (let j = i + first; j < sum.length; j++) sum[j] = (sum[j] ?? 0) + weight * (flow[j - i] ?? 0);
  }
  return sum;
}

/** How often an egg laid at one of these times has seen 0, 1, 2, … ticks by the end of the segment. */
function tickWeights(kernel: NestKernel, { days, steps, rate }: Segment, laid: Float64Array): Float64Array {
  const { clock } = kernel.full(rate);
  const longest = kernel.weightsOf((clock * days * (steps - 0.5)) / steps);
  const sum = new Float64Array(longest.first + longest.weights.length);
  for (let i = 0; i < laid.length; i++) {
    const mass = laid[i] ?? 0;
    if (mass < LEAST) continue;
    const { first, weights } = kernel.weightsOf((clock * days * (steps - i - 0.5)) / steps);
    for (let n = 0; n < weights.length; n++) sum[first + n] = (sum[first + n] ?? 0) + mass * (weights[n] ?? 0);
  }
  return sum;
}

/** Mixes the rows of an egg over the times it may have been laid at, seen from the end of the segment. */
function mixedRows(kernel: NestKernel, segment: Segment, laid: Float64Array): { end: Float64Array; used: Blocks } {
  const weights = tickWeights(kernel, segment, laid);
  const { rows, blocks, chain } = kernel.eggRows(segment.rate, weights.length);
  const end = new Float64Array(chain.states);
  const used = blocksOf(chain, 0);
  for (let n = 0; n < weights.length; n++) {
    const [row, active, weight] = [rows[n], blocks[n], weights[n] ?? 0];
    if (weight < LEAST || !row || !active) continue;
    addScaled(end, { vector: row, weight }, active);
    joinBlocks(used, active);
  }
  return { end, used };
}

/** Works something out when it is first asked for. */
function once<T>(make: () => T): () => T {
  let made: T | undefined;
  return () => (made ??= make());
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
  const { end, used } = mixedRows(kernel, segment, laid);
  end[NEW_CELL] = (end[NEW_CELL] ?? 0) + waiting;
  used[0] = 1;
  const later = () => convolve(laid, kernel.eggFlows(segment).relaid, step);
  const capping = () => convolve(laid, kernel.eggFlows(segment).capping, step);
  return { end, used, first: laid, later: once(later), capping: once(capping) };
}
