import type { FactorNode } from './nest-factor';
import { type PoissonWeights, poissonMean, poissonWeights } from './poisson';

/** Days between two points at which a law is worked out; between them it is taken as a straight line. */
const GRID_STEP = 0.25;

/** A law is followed until it is this complete, well past the outermost quantile shown. */
const COMPLETE = 1 - 1e-5;
const NODE_COMPLETE = 1 - 1e-12;
const MOST_POINTS = 3_000;

/** The distribution of a time in calendar days: P(at most 0, 0.25, 0.5, … days). */
export interface DayLaw {
  /** One distribution for each value of the nest factor. */
  byNode: readonly Float64Array[];
  /** The same, averaged over the nest factor. */
  mixed: Float64Array;
}

/** The average of a node-by-node value over the nest factor. */
export function mixNodes(nodes: readonly FactorNode[], values: readonly number[]): number {
  return nodes.reduce((sum, { weight }, m) => sum + weight * (values[m] ?? 0), 0);
}

/** One passage on its way to a law. */
interface Passage {
  sequence: Float64Array;
  byNode: number[][];
  mixed: number[];
}

/** Has every one of these passages arrived for good at a value of the nest factor? */
function isNodeComplete(passages: readonly Passage[], node: number): boolean {
  return passages.every(({ byNode }) => (byNode[node]?.at(-1) ?? 0) > NODE_COMPLETE);
}

/** Adds the values of one grid point to a passage; null weights mean that it has arrived. */
function addPoint(passage: Passage, weights: readonly (PoissonWeights | null)[], nodes: readonly FactorNode[]): void {
  const values = weights.map((weight) => (weight ? poissonMean(passage.sequence, weight) : 1));
  values.forEach((value, m) => passage.byNode[m]?.push(value));
  passage.mixed.push(mixNodes(nodes, values));
}

/**
 * Turns passages, counted in ticks of the chain's clock, into laws in calendar days.
 * The Poisson weights of a grid point are worked out once and serve every passage that has not arrived yet.
 *
 * @param clock ticks a day at factor 1.
 * @param sequences probability of having arrived after 0, 1, 2, … ticks.
 */
export function dayLaws(clock: number, nodes: readonly FactorNode[], sequences: readonly Float64Array[]): DayLaw[] {
  const passages = sequences.map<Passage>((sequence) => ({ sequence, byNode: nodes.map(() => []), mixed: [] }));
  let open = passages;
  for (let i = 0; i < MOST_POINTS && open.length > 0; i++) {
    const ticks = clock * i * GRID_STEP;
    const weights = nodes.map(({ rate }, m) => (isNodeComplete(open, m) ? null : poissonWeights(rate * ticks)));
    for (const passage of open) addPoint(passage, weights, nodes);
    open = open.filter(({ mixed }) => (mixed.at(-1) ?? 1) < COMPLETE);
  }
  return passages.map(({ byNode, mixed }) => ({
    byNode: byNode.map((values) => Float64Array.from(values)),
    mixed: Float64Array.from(mixed),
  }));
}

/** P(at most `days`), linear between grid points, 0 before the first and the last value beyond the end. */
export function cdfAt(cdf: Float64Array, days: number): number {
  const at = days / GRID_STEP;
  if (at <= 0) return 0;
  const i = Math.floor(at);
  const low = cdf[i];
  if (low === undefined) return cdf.at(-1) ?? 1;
  return low + (at - i) * ((cdf[i + 1] ?? low) - low);
}

/** The number of days that is not exceeded with probability `p`, linear between grid points. */
export function quantileDays(cdf: Float64Array, p: number): number {
  let [low, high] = [0, cdf.length - 1];
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((cdf[middle] ?? 1) < p) low = middle;
    else high = middle;
  }
  const [below, above] = [cdf[low] ?? 0, cdf[high] ?? 1];
  return GRID_STEP * (low + (above > below ? Math.min(1, Math.max(0, (p - below) / (above - below))) : 0));
}
