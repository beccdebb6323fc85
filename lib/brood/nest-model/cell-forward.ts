import { massPass } from '@/lib/brood/hmm/power-pass';
import { type Blocks, blocksOf } from '@/lib/brood/hmm/uniformised';
import { NOT_BUILT } from '@/lib/brood/hmm/brood-states';
import type { BuildingPrior } from './building';
import { NEW_CELL } from './brood-model';
import { LEAST, type NestKernel } from './nest-kernel';
import { type Newcomers, firstEggs, newcomersOf } from './newcomers';
import type { Segment, Timeline } from './timeline';

/** Flows of one segment by step, given what was seen before it. */
export interface ForwardPart {
  first: Float64Array;
  later: Float64Array;
  capping: Float64Array;
  used: Blocks;
  /** Logarithm of what was divided out before the segment. */
  log: number;
}

/** A cell followed forward to its last look. */
export interface ForwardPass {
  logLik: number;
  parts: ForwardPart[];
  /** State probabilities at the last look given everything seen. */
  last: Float64Array;
  /** State probabilities at each visit, given what was seen until then. */
  atLooks: Float64Array[];
  /** Some look could not be explained at all. */
  isImpossible: boolean;
}

/** Where a cell stands: masses once built, and the weight that its not being built has in what was seen. */
interface Standing {
  mass: Float64Array;
  /** Likelihood of the looks so far if it is not built; times the prior it is the mass. */
  unbuilt: number;
  log: number;
}

/** The work of a node that cells of one rank share. */
export type SharedNewcomers = (prior: BuildingPrior, segment: number) => Newcomers;

/** Keeps newcomers by prior and segment. */
export function sharedNewcomers(kernel: NestKernel, timeline: Timeline): SharedNewcomers {
  const known = new Map<BuildingPrior, Map<number, Newcomers>>();
  const firstSteps = timeline.segments.reduce<number[]>((all, { steps }) => [...all, (all.at(-1) ?? 0) + steps], [0]);
  return (prior, s) => {
    const ofPrior = known.get(prior) ?? new Map<number, Newcomers>();
    known.set(prior, ofPrior);
    const segment = timeline.segments[s];
    const made = ofPrior.get(s);
    if (made) return made;
    if (!segment) throw new RangeError(`no segment ${s}`);
    const fresh = newcomersOf(kernel, segment, { mass: prior.mass, firstStep: firstSteps[s] ?? 0 });
    ofPrior.set(s, fresh);
    return fresh;
  };
}

function plus(sum: Float64Array, more: Float64Array, weight: number): void {
  for (let i = 0; i < sum.length; i++) sum[i] = (sum[i] ?? 0) + weight * (more[i] ?? 0);
}

/** What was built before the segment moves on through it. */
function moveOn(
  kernel: NestKernel,
  segment: Segment,
  { mass, isFlowNeeded }: { mass: Float64Array; isFlowNeeded: boolean },
): Omit<ForwardPart, 'log'> & { end: Float64Array } {
  const { days, steps, rate } = segment;
  const chain = kernel.full(rate);
  const step = days / steps;
  if (mass.every((p) => p <= LEAST)) {
    const none = new Float64Array(steps);
    const end = new Float64Array(mass.length);
    return { first: none, later: none.slice(), capping: none.slice(), used: blocksOf(chain, 0), end };
  }
  const at = Float64Array.from({ length: steps }, (_, i) => (i + 0.5) * step);
  const { end, watched, used } = massPass(chain, mass, {
    days,
    least: LEAST,
    weightsOf: kernel.weightsOf,
    watch: isFlowNeeded ? [kernel.model.relayGate, kernel.cappingGate(rate)].map((gate) => ({ gate, at })) : [],
  });
  const { laid } = firstEggs(new Float64Array(steps), {
    layFirst: kernel.model.layFirst,
    step,
    waiting: mass[NEW_CELL] ?? 0,
  });
  const [later, capping] = watched.map((flow) => flow.map((perDay) => perDay * step));
  return { first: laid, later: later ?? laid, capping: capping ?? laid, used, end };
}

/** Takes a look into account; null when nothing can explain it. */
function take(standing: Standing, likelihood: Float64Array, absent: number): Standing | null {
  const mass = standing.mass.map((p, s) => p * (likelihood[s] ?? 0));
  const unbuilt = standing.unbuilt * (likelihood[NOT_BUILT] ?? 0);
  const total = mass.reduce((sum, p) => sum + p, 0) + unbuilt * absent;
  if (!(total > 0)) return null;
  return { mass: mass.map((p) => p / total), unbuilt: unbuilt / total, log: standing.log + Math.log(total) };
}

/**
 * Follows a cell forward through everything seen of it.
 *
 * @param cell `isFlowNeeded` false when only the likelihood and the states are asked for.
 */
export function forwardCell(
  kernel: NestKernel,
  timeline: Timeline,
  cell: {
    prior: BuildingPrior;
    seen: readonly (Float64Array | null)[];
    newcomers: SharedNewcomers;
    isFlowNeeded: boolean;
  },
): ForwardPass {
  const { prior, seen, newcomers, isFlowNeeded } = cell;
  let standing: Standing = { mass: new Float64Array(kernel.model.states.count), unbuilt: 1, log: 0 };
  const parts: ForwardPart[] = [];
  const atLooks: Float64Array[] = [];
  let edge = 0;
  let isImpossible = false;
  for (const [s, segment] of timeline.segments.entries()) {
    const { end, ...moved } = moveOn(kernel, segment, { mass: standing.mass, isFlowNeeded });
    const before = (prior.absent[edge] ?? 0) * standing.unbuilt;
    edge += segment.steps;
    if (before > LEAST) {
      const fresh = newcomers(prior, s);
      plus(end, fresh.end, standing.unbuilt);
      if (isFlowNeeded) {
        plus(moved.first, fresh.first, standing.unbuilt);
        plus(moved.later, fresh.later(), standing.unbuilt);
        plus(moved.capping, fresh.capping(), standing.unbuilt);
      }
      fresh.used.forEach((is, b) => {
        if (is === 1) moved.used[b] = 1;
      });
    }
    parts.push({ ...moved, log: standing.log });
    standing = { ...standing, mass: end };
    if (segment.look === null) continue;
    const likelihood = seen[segment.look];
    const taken = likelihood ? take(standing, likelihood, prior.absent[edge] ?? 0) : standing;
    isImpossible ||= taken === null;
    standing = taken ?? standing;
    const whole = standing.mass.slice();
    whole[NOT_BUILT] = standing.unbuilt * (prior.absent[edge] ?? 0);
    atLooks.push(whole);
    if (segment.look + 1 >= seen.length) break;
  }
  return { logLik: standing.log, parts, last: standing.mass, atLooks, isImpossible };
}
