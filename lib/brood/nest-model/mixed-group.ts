import { type LossByStage, lossTotal } from '@/lib/brood/losses';
import type { TimeLaw } from '@/lib/brood/time-law';
import type { BroodModel } from './brood-model';
import type { Future } from './cell-outlook';
import type { PosteriorNode } from './nest-posterior';
import type { GroupAnswer } from './node-answer';

/** A group of equal cells, averaged over the nest factor. */
export interface MixedGroup {
  /** P(living brood in the cell at its last look). */
  alive: number;
  /** The most probable brood of the cell, 0 when most likely none was laid. */
  generation: number;
  /** P(an adult came out of the present or last brood | the cell is empty at its last look); null when not built. */
  emergedWhenEmpty: number | null;
  /** P(an adult has just come out) at the look where that is most probable. */
  mostEmerged: number;
  /** The rest is given living brood at the last look; null when there cannot be any. */
  present: PresentBrood | null;
}

/** Living brood at the last look. */
export interface PresentBrood {
  laid: TimeLaw;
  capped: TimeLaw;
  out: TimeLaw;
  /** P(an adult comes out). */
  chance: number;
  losses: LossByStage;
}

/** What times the laws of a group run over, in days since the first look. */
export interface GroupTimes {
  /** Edges of the timeline. */
  edges: Float64Array;
  lastLook: number;
  future: Future;
}

/** One node's answer for a group, with its weight. */
interface Weighted {
  weight: number;
  answer: GroupAnswer;
}

function mean(items: readonly Weighted[], value: (answer: GroupAnswer) => number): number {
  return items.reduce((sum, { weight, answer }) => sum + weight * value(answer), 0);
}

function meanVector(
  items: readonly Weighted[],
  value: (answer: GroupAnswer) => Float64Array | undefined,
): Float64Array {
  const sum = new Float64Array(items[0] ? (value(items[0].answer)?.length ?? 0) : 0);
  for (const { weight, answer } of items) {
    value(answer)?.forEach((x, i) => {
      sum[i] = (sum[i] ?? 0) + weight * x;
    });
  }
  return sum;
}

/** Running sums with a 0 before. */
export function cumulated(mass: Float64Array): Float64Array {
  const sums = new Float64Array(mass.length + 1);
  mass.forEach((p, i) => {
    sums[i + 1] = (sums[i] ?? 0) + p;
  });
  return sums;
}

/** Divides by the last value, so that a law ends at 1. */
function complete(cdf: Float64Array): Float64Array {
  const end = cdf.at(-1) ?? 0;
  return end > 0 ? cdf.map((p) => p / end) : cdf;
}

function presentOf(living: readonly Weighted[], { edges, lastLook, future }: GroupTimes): PresentBrood {
  const laid = cumulated(meanVector(living, ({ laid: mass }) => mass));
  const past = cumulated(meanVector(living, ({ capped }) => capped));
  const later = meanVector(living, ({ outlook }) => outlook?.capped);
  const out = meanVector(living, ({ outlook }) => outlook?.out);
  const before = edges.findIndex((edge) => edge >= lastLook - 1e-9) + 1;
  const after = future.times.map((time) => time + lastLook);
  const loss = (stage: keyof LossByStage) => mean(living, ({ outlook }) => outlook?.losses[stage] ?? 0);
  const losses = { egg: loss('egg'), larva: loss('larva'), capped: loss('capped') };
  return {
    laid: { times: edges, cdf: complete(laid) },
    capped: {
      times: Float64Array.from([...edges.subarray(0, before), ...after.subarray(1)]),
      cdf: complete(Float64Array.from([...past.subarray(0, before), ...later.subarray(1)])),
    },
    out: { times: after, cdf: complete(out) },
    chance: 1 - lossTotal(losses),
    losses,
  };
}

/** Probability of a kind of state by its generation. */
function byGeneration({ states }: BroodModel, mass: Float64Array, holds: (key: string) => boolean): number[] {
  const sums = Array<number>(states.generations + 1).fill(0);
  mass.forEach((p, s) => {
    const g = states.generationOf[s] ?? 0;
    if (holds(states.keys[s] ?? '')) sums[g] = (sums[g] ?? 0) + p;
  });
  return sums;
}

const sum = (values: readonly number[]) => values.reduce((a, b) => a + b, 0);

/** Averages a group over the nest factor. */
export function mixedGroup(
  model: BroodModel,
  { nodes, group }: { nodes: readonly PosteriorNode[]; group: number },
  times: GroupTimes,
): MixedGroup {
  const all = nodes.flatMap(({ weight, groups }) => (groups[group] ? [{ weight, answer: groups[group] }] : []));
  const alive = mean(all, ({ outlook }) => outlook?.alive ?? 0);
  const looks = all[0]?.answer.forward.atLooks.length ?? 0;
  const atLook = (i: number) => meanVector(all, ({ forward }) => forward.atLooks[i]);
  const last = atLook(looks - 1);
  const emerged = (mass: Float64Array) => sum(byGeneration(model, mass, (key) => key.startsWith('EM#')));
  const lost = sum(byGeneration(model, last, (key) => key.startsWith('RM')));
  const perGeneration = byGeneration(model, last, () => true);
  const gone = emerged(last) + lost;
  const living = all.map(({ weight, answer }) => ({
    weight: (weight * (answer.outlook?.alive ?? 0)) / Math.max(alive, Number.MIN_VALUE),
    answer,
  }));
  return {
    alive,
    generation: perGeneration.indexOf(Math.max(...perGeneration)),
    emergedWhenEmpty: gone > 0 ? emerged(last) / gone : null,
    mostEmerged: Math.max(0, ...Array.from({ length: looks }, (_, i) => emerged(atLook(i)))),
    present: alive > 0 ? presentOf(living, times) : null,
  };
}
