import { massPasses } from '@/lib/brood/hmm/tile-pass';
import { type Blocks, blocksOf, joinBlocks } from '@/lib/brood/hmm/uniformised';
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

/** What happens within a segment, and the masses at its end before its look. */
type Moved = Omit<ForwardPart, 'log'> & { end: Float64Array };

/** Cells move on through a segment together: what was built before it. */
function moveOn(
  kernel: NestKernel,
  segment: Segment,
  { masses, isFlowNeeded }: { masses: readonly Float64Array[]; isFlowNeeded: boolean },
): Moved[] {
  const { days, steps, rate } = segment;
  const chain = kernel.full(rate);
  const step = days / steps;
  const at = Float64Array.from({ length: steps }, (_, i) => (i + 0.5) * step);
  const moving = masses.filter((mass) => mass.some((p) => p > LEAST));
  const results = massPasses(chain, moving, {
    days,
    least: LEAST,
    weightsOf: kernel.weightsOf,
    watch: isFlowNeeded ? [kernel.model.relayGate, kernel.cappingGate(rate)].map((gate) => ({ gate, at })) : [],
  });
  const byMass = new Map(moving.map((mass, i) => [mass, results[i]]));
  return masses.map((mass) => {
    const moved = byMass.get(mass);
    const waiting = mass[NEW_CELL] ?? 0;
    const { laid } = firstEggs(new Float64Array(steps), { layFirst: kernel.model.layFirst, step, waiting });
    const flow = (i: number) => moved?.watched[i]?.map((perDay) => perDay * step) ?? new Float64Array(steps);
    return {
      first: laid,
      later: flow(0),
      capping: flow(1),
      used: moved?.used.slice() ?? blocksOf(chain, 0),
      end: moved?.end ?? new Float64Array(mass.length),
    };
  });
}

/** Takes a look into account; null when nothing can explain it. */
function take(standing: Standing, likelihood: Float64Array, absent: number): Standing | null {
  const mass = new Float64Array(standing.mass.length);
  const unbuilt = standing.unbuilt * (likelihood[NOT_BUILT] ?? 0);
  let total = unbuilt * absent;
  for (let s = 0; s < mass.length; s++) {
    const seen = (standing.mass[s] ?? 0) * (likelihood[s] ?? 0);
    mass[s] = seen;
    total += seen;
  }
  if (!(total > 0)) return null;
  for (let s = 0; s < mass.length; s++) mass[s] = (mass[s] ?? 0) / total;
  return { mass, unbuilt: unbuilt / total, log: standing.log + Math.log(total) };
}

/** A cell to follow. */
export interface ForwardCell {
  prior: BuildingPrior;
  seen: readonly (Float64Array | null)[];
}

/** A cell on its way. */
interface Walk extends Omit<ForwardPass, 'logLik' | 'last'> {
  cell: ForwardCell;
  standing: Standing;
}

/** Adds the cells built within the segment to those that were there. */
function addNewcomers(
  moved: Moved,
  fresh: Newcomers,
  { unbuilt, isFlowNeeded }: { unbuilt: number; isFlowNeeded: boolean },
) {
  plus(moved.end, fresh.end, unbuilt);
  joinBlocks(moved.used, fresh.used);
  if (!isFlowNeeded) return;
  plus(moved.first, fresh.first, unbuilt);
  plus(moved.later, fresh.later(), unbuilt);
  plus(moved.capping, fresh.capping(), unbuilt);
}

/** Takes the look at the end of a segment into account; one that nothing can explain is passed over. */
function lookAt(walk: Walk, look: number, absent: number): void {
  const likelihood = walk.cell.seen[look];
  const taken = likelihood ? take(walk.standing, likelihood, absent) : walk.standing;
  walk.isImpossible ||= taken === null;
  walk.standing = taken ?? walk.standing;
  const whole = walk.standing.mass.slice();
  whole[NOT_BUILT] = walk.standing.unbuilt * absent;
  walk.atLooks.push(whole);
}

/**
 * Follows cells forward through everything seen of them, side by side.
 *
 * @param work `isFlowNeeded` false when only the likelihood and the states are asked for.
 */
export function forwardCells(
  kernel: NestKernel,
  timeline: Timeline,
  {
    cells,
    newcomers,
    isFlowNeeded,
  }: { cells: readonly ForwardCell[]; newcomers: SharedNewcomers; isFlowNeeded: boolean },
): ForwardPass[] {
  const walks = cells.map((cell): Walk => {
    const standing = { mass: new Float64Array(kernel.model.states.count), unbuilt: 1, log: 0 };
    return { cell, standing, parts: [], atLooks: [], isImpossible: false };
  });
  let edge = 0;
  for (const [s, segment] of timeline.segments.entries()) {
    const open = walks.filter(({ cell, atLooks }) => atLooks.length < cell.seen.length);
    const moved = moveOn(kernel, segment, { masses: open.map(({ standing }) => standing.mass), isFlowNeeded });
    open.forEach((walk, i) => {
      const { standing, cell } = walk;
      const part = moved[i];
      if (!part) return;
      const { unbuilt } = standing;
      if ((cell.prior.absent[edge] ?? 0) * unbuilt > LEAST)
        addNewcomers(part, newcomers(cell.prior, s), { unbuilt, isFlowNeeded });
      const { end, ...flows } = part;
      walk.parts.push({ ...flows, log: standing.log });
      walk.standing = { ...standing, mass: end };
      if (segment.look !== null) lookAt(walk, segment.look, cell.prior.absent[edge + segment.steps] ?? 0);
    });
    edge += segment.steps;
  }
  return walks.map(({ standing, parts, atLooks, isImpossible }) => {
    return { logLik: standing.log, parts, last: standing.mass, atLooks, isImpossible };
  });
}
