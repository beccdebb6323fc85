import type { SpeedPiece, Transitions } from '@/lib/brood/hmm/transitions';
import type { Span } from '@/lib/brood/hmm/chain';
import type { Start, Station } from '@/lib/brood/hmm/stations';

/**
 * A second, independent way to the same answers: dense matrices, and exp(Q t) by scaling and squaring of a Taylor
 * series. Slow, plain, and sharing nothing with the product but the description of the chain.
 */
export type Matrix = number[][];

const TAYLOR_TERMS = 24;

function identity(n: number): Matrix {
  return Array.from({ length: n }, (_, i) => Array.from({ length: n }, (_v, j) => (i === j ? 1 : 0)));
}

function multiply(a: Matrix, b: Matrix): Matrix {
  return a.map((row) => (b[0] ?? []).map((_, j) => row.reduce((sum, x, k) => sum + x * (b[k]?.[j] ?? 0), 0)));
}

/** exp(A). */
function exponential(a: Matrix): Matrix {
  const norm = Math.max(...a.map((row) => row.reduce((sum, x) => sum + Math.abs(x), 0)));
  const halvings = Math.max(0, Math.ceil(Math.log2(Math.max(norm, 1e-300))) + 2);
  const small = a.map((row) => row.map((x) => x / 2 ** halvings));
  let term = identity(a.length);
  let sum = identity(a.length);
  for (let n = 1; n <= TAYLOR_TERMS; n++) {
    term = multiply(term, small).map((row) => row.map((x) => x / n));
    sum = sum.map((row, i) => row.map((x, j) => x + (term[i]?.[j] ?? 0)));
  }
  for (let i = 0; i < halvings; i++) sum = multiply(sum, sum);
  return sum;
}

/** The generator at given speeds of the clocks. */
function generator({ states, source, target, rates }: Transitions, speeds: readonly number[]): Matrix {
  const q = Array.from({ length: states }, () => Array<number>(states).fill(0));
  source.forEach((from, i) => {
    const rate = rates.reduce((sum, of, clock) => sum + (speeds[clock] ?? 0) * (of[i] ?? 0), 0);
    const [row, to] = [q[from] ?? [], target[i] ?? 0];
    row[to] = (row[to] ?? 0) + rate;
    row[from] = (row[from] ?? 0) - rate;
  });
  return q;
}

/** P(state at `to` | state at `from`), the product of one exponential for each piece. */
export function transitionMatrix(moves: Transitions, pieces: readonly SpeedPiece[], { from, to }: Span): Matrix {
  let product = identity(moves.states);
  pieces.forEach(({ speeds, from: start }, i) => {
    const begin = i === 0 ? from : Math.max(from, start);
    const days = Math.min(to, pieces[i + 1]?.from ?? Infinity) - begin;
    if (days <= 0) return;
    product = multiply(product, exponential(generator(moves, speeds).map((row) => row.map((rate) => rate * days))));
  });
  return product;
}

/** Log-likelihood and smoothed state probabilities, from joint probabilities without any normalising on the way. */
export function denseSmooth(
  { moves, pieces, start }: { moves: Transitions; pieces: readonly SpeedPiece[]; start: Start },
  stations: readonly Station[],
): { logLik: number; smoothed: number[][] } {
  const steps = stations.map(({ time }, i) =>
    transitionMatrix(moves, pieces, { from: stations[i - 1]?.time ?? start.time, to: time }),
  );
  const weigh = (values: readonly number[], i: number) => values.map((x, s) => x * (stations[i]?.likelihood?.[s] ?? 1));
  const alphas: number[][] = [];
  steps.forEach((step, i) => {
    const before = alphas[i - 1] ?? Array.from(start.mass);
    alphas.push(weigh(multiply([before], step)[0] ?? [], i));
  });
  const betas: number[][] = [Array<number>(moves.states).fill(1)];
  for (let i = steps.length - 1; i > 0; i--) {
    const later = weigh(betas[0] ?? [], i);
    betas.unshift((steps[i] ?? []).map((row) => row.reduce((sum, p, s) => sum + p * (later[s] ?? 0), 0)));
  }
  const total = (alphas.at(-1) ?? []).reduce((sum, p) => sum + p, 0);
  const smoothed = alphas.map((alpha, i) => alpha.map((p, s) => (p * (betas[i]?.[s] ?? 0)) / total));
  return { logLik: Math.log(total), smoothed };
}
