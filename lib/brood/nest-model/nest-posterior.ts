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
  /** Posterior mean and standard deviation of log ρ. */
  logRho: { mean: number; sd: number };
}

/** Where a function of z is largest, and how wide its peak is. */
interface Peak {
  at: number;
  sd: number;
}

/** The parabola through three points: its top and width; null when it has no top. */
function parabola(low: number, middle: number, high: number): Peak | null {
  const curvature = low - 2 * middle + high;
  if (!(curvature < 0)) return null;
  return { at: (low - high) / (2 * curvature), sd: 1 / Math.sqrt(-curvature) };
}

const MOST_MOVES = 6;

/** Finds the peak of a smooth function of one variable by parabolas; the width comes from the last one. */
function findPeak(f: (z: number) => number): Peak {
  let [at, half, sd] = [0, 1, 1];
  for (let i = 0; i < MOST_MOVES; i++) {
    const [low, middle, high] = [f(at - half), f(at), f(at + half)];
    const top = parabola(low, middle, high);
    const uphill = low > high ? -2 : 2;
    const move = top ? Math.max(-2, Math.min(2, top.at)) : uphill;
    if (top) sd = Math.min(1, Math.max(0.02, top.sd * half));
    at += move * half;
    const isSettled = top !== null && Math.abs(move) * half < 0.35 * sd && half < 2.5 * sd;
    if (isSettled) break;
    half = Math.min(half, Math.max(0.75 * sd, 0.05));
  }
  return { at, sd };
}

function kept(f: (z: number) => number): (z: number) => number {
  const known = new Map<number, number>();
  return (z) => {
    const value = known.get(z) ?? f(z);
    known.set(z, value);
    return value;
  };
}

/**
 * Integrates over the nest factor: 7 Gauss–Hermite nodes around the most probable value, as wide as its peak (Liu &
 * Pierce 1994), each with the likelihood of all cells together.
 */
export function nestPosterior(model: BroodModel, prior: FactorPrior, frame: NestFrame): NestPosterior {
  const rhoOf = (z: number) => Math.exp(prior.mean + prior.sd * z);
  if (prior.sd === 0 || frame.groups.length === 0) return fixedFactor(model, prior, frame);
  const { at, sd } = findPeak(kept((z) => nodeLogLik(nestKernel(model, rhoOf(z)), frame) - (z * z) / 2));
  const nodes = normalNodes().map(({ z, weight }) => {
    const value = at + sd * z;
    const { logLik, groups } = nodeAnswer(nestKernel(model, rhoOf(value)), frame);
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
    best: nestKernel(model, rhoOf(at)),
    logRho: { mean: prior.mean + prior.sd * mean, sd: prior.sd * Math.sqrt(variance) },
  };
}

function fixedFactor(model: BroodModel, { mean, sd }: FactorPrior, frame: NestFrame): NestPosterior {
  const rho = Math.exp(mean);
  const best = nestKernel(model, rho);
  return { nodes: [{ rho, weight: 1, groups: nodeAnswer(best, frame).groups }], best, logRho: { mean, sd } };
}
