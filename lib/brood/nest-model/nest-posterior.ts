import { normalNodes } from '@/lib/brood/nest-factor';
import type { BroodModel } from './brood-model';
import { type NestKernel, nestKernel } from './nest-kernel';
import { type GroupAnswer, type NestFrame, nodeAnswer, nodeLogLik } from './node-answer';

/** Prior of the nest factor: log ρ is normal. */
export interface FactorPrior {
  mean: number;
  sd: number;
}

/** One value of the nest factor with its posterior weight. */
export interface PosteriorNode {
  rho: number;
  weight: number;
  groups: readonly GroupAnswer[];
}

/** The nest given everything seen. */
export interface NestPosterior {
  nodes: readonly PosteriorNode[];
  /** The chain at the most probable value of the nest factor. */
  best: NestKernel;
  /** Log-likelihood of each group there. */
  logLiks: readonly number[];
  /** Posterior mean and standard deviation of log ρ. */
  logRho: { mean: number; sd: number };
}

/** Where a function of z is largest, and how wide its peak is. */
interface Peak {
  at: number;
  sd: number;
}

/** A point of the function. */
interface Point {
  z: number;
  f: number;
}

/** The parabola through three points: its top and width; null when it has no top. */
function parabola([a, b, c]: readonly [Point, Point, Point]): Peak | null {
  const [left, right] = [(b.f - a.f) / (b.z - a.z), (c.f - b.f) / (c.z - b.z)];
  const curvature = (2 * (right - left)) / (c.z - a.z);
  if (!(curvature < 0)) return null;
  const slope = left + (curvature * (b.z - a.z)) / 2;
  return { at: b.z - slope / curvature, sd: 1 / Math.sqrt(-curvature) };
}

/** The best point with one neighbour on each side, or the three best-lying points at a side. */
function aroundBest(points: readonly Point[]): readonly [Point, Point, Point] {
  const sorted = [...points].sort((p, q) => p.z - q.z);
  const best = sorted.reduce((top, { f }, i) => (f > (sorted[top]?.f ?? -Infinity) ? i : top), 0);
  const first = Math.min(Math.max(best - 1, 0), sorted.length - 3);
  const [a, b, c] = sorted.slice(first, first + 3);
  if (!a || !b || !c) throw new RangeError('a parabola needs three points');
  return [a, b, c];
}

const MOST_POINTS = 12;
/** Nodes a little beside the peak, or a little too wide, do no harm: they carry their own weights. */
const CLOSE_ENOUGH = 0.3;

/**
 * Finds the peak of a smooth function of one variable, and its width, by parabolas through the best points so far.
 * A point is added beside the top as well, so that the width is that of the peak and not of its surroundings.
 */
function findPeak(f: (z: number) => number): Peak {
  const points = [-1, 0, 1].map((z) => ({ z, f: f(z) }));
  let top: Peak = { at: 0, sd: 1 };
  while (points.length < MOST_POINTS) {
    const three = aroundBest(points);
    const found = parabola(three);
    const [low, , high] = three;
    if (found)
      top = { at: Math.min(high.z + 1, Math.max(low.z - 1, found.at)), sd: Math.min(1, Math.max(0.01, found.sd)) };
    else top = { at: high.f > low.f ? high.z + 1 : low.z - 1, sd: 1 };
    const near = points.filter(({ z }) => Math.abs(z - top.at) < CLOSE_ENOUGH * top.sd);
    const isNarrow = high.z - low.z < 4.5 * top.sd;
    if (found && near.length > 0 && isNarrow) break;
    const beside = top.at + (top.at - low.z > high.z - top.at ? -1 : 1) * top.sd;
    points.push(...[near.length > 0 ? beside : top.at].map((z) => ({ z, f: f(z) })));
  }
  return top;
}

/** Number of the node at the peak. */
const MIDDLE = 3;

function logLiksOf(groups: readonly GroupAnswer[] = []): number[] {
  return groups.map(({ forward }) => forward.logLik);
}

/**
 * Integrates over the nest factor: 7 Gauss–Hermite nodes around the most probable value, as wide as its peak (Liu &
 * Pierce 1994), each with the likelihood of all cells together.
 */
export function nestPosterior(model: BroodModel, prior: FactorPrior, frame: NestFrame): NestPosterior {
  const rhoOf = (z: number) => Math.exp(prior.mean + prior.sd * z);
  if (prior.sd === 0 || frame.groups.length === 0) return fixedFactor(model, prior, frame);
  const { at, sd } = findPeak((z) => nodeLogLik(nestKernel(model, rhoOf(z)), frame) - (z * z) / 2);
  const best = nestKernel(model, rhoOf(at));
  const nodes = normalNodes().map(({ z, weight }) => {
    const value = at + sd * z;
    const { logLik, groups } = nodeAnswer(z === 0 ? best : nestKernel(model, rhoOf(value)), frame);
    return { z: value, groups, log: Math.log(weight) + (z * z) / 2 + logLik - (value * value) / 2 };
  });
  const most = Math.max(...nodes.map(({ log }) => log));
  const raw = nodes.map(({ log }) => Math.exp(log - most));
  const total = raw.reduce((sum, weight) => sum + weight, 0);
  const weights = raw.map((weight) => weight / total);
  const mean = nodes.reduce((sum, { z }, i) => sum + z * (weights[i] ?? 0), 0);
  const variance = nodes.reduce((sum, { z }, i) => sum + (z - mean) ** 2 * (weights[i] ?? 0), 0);
  return {
    nodes: nodes.map(({ z, groups }, i) => ({ rho: rhoOf(z), weight: weights[i] ?? 0, groups })),
    best,
    logLiks: logLiksOf(nodes[MIDDLE]?.groups),
    logRho: { mean: prior.mean + prior.sd * mean, sd: prior.sd * Math.sqrt(variance) },
  };
}

function fixedFactor(model: BroodModel, { mean, sd }: FactorPrior, frame: NestFrame): NestPosterior {
  const rho = Math.exp(mean);
  const best = nestKernel(model, rho);
  const { groups } = nodeAnswer(best, frame);
  return { nodes: [{ rho, weight: 1, groups }], best, logLiks: logLiksOf(groups), logRho: { mean, sd } };
}
