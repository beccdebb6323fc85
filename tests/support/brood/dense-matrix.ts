import type { Transitions } from '@/lib/brood/hmm/transitions';

/** A square matrix, row after row in one typed array. */
export interface Dense {
  n: number;
  values: Float64Array;
}

function zeros(n: number): Dense {
  return { n, values: new Float64Array(n * n) };
}

function identity(n: number): Dense {
  const one = zeros(n);
  for (let i = 0; i < n; i++) one.values[i * n + i] = 1;
  return one;
}

/** A · B, passing over zeros of A. */
function multiply(a: Dense, b: Dense): Dense {
  const { n } = a;
  const product = zeros(n);
  const [left, right, out] = [a.values, b.values, product.values];
  for (let i = 0; i < n; i++) {
    const row = i * n;
    for (let k = 0; k < n; k++) {
      const x = left[row + k] as number;
      if (x === 0) continue;
      const from = k * n;
      for (let j = 0; j < n; j++) out[row + j] = (out[row + j] as number) + x * (right[from + j] as number);
    }
  }
  return product;
}

/** The sum of matrices, each with its weight. */
function combination(terms: readonly (readonly [weight: number, matrix: Dense])[]): Dense {
  const sum = zeros(terms[0]?.[1].n ?? 0);
  for (const [weight, { values }] of terms) {
    for (let i = 0; i < values.length; i++) sum.values[i] = (sum.values[i] as number) + weight * (values[i] as number);
  }
  return sum;
}

/** A to a whole power, by squaring. */
export function power(a: Dense, exponent: number): Dense {
  if (exponent === 0) return identity(a.n);
  if (exponent === 1) return a;
  const half = power(a, Math.floor(exponent / 2));
  const square = multiply(half, half);
  return exponent % 2 === 1 ? multiply(square, a) : square;
}

/** The generator at given speeds of the clocks. */
export function denseGenerator({ states, source, target, rates }: Transitions, speeds: readonly number[]): Dense {
  const q = zeros(states);
  source.forEach((from, i) => {
    const rate = rates.reduce((sum, of, clock) => sum + (speeds[clock] ?? 0) * (of[i] ?? 0), 0);
    const [to, stay] = [from * states + (target[i] ?? 0), from * states + from];
    q.values[to] = (q.values[to] ?? 0) + rate;
    q.values[stay] = (q.values[stay] ?? 0) - rate;
  });
  return q;
}

/** The rows and columns `from` … `to − 1`. */
export function subMatrix({ n, values }: Dense, from: number, to: number): Dense {
  const part = zeros(to - from);
  for (let i = from; i < to; i++) part.values.set(values.subarray(i * n + from, i * n + to), (i - from) * part.n);
  return part;
}

/** Coefficients of the Taylor series up to the 15th power, in four groups of four. */
const TAYLOR = Array.from({ length: 16 }, (_, k) =>
  Array.from({ length: k }, (_v, i) => i + 1).reduce((a, b) => a / b, 1),
);

/**
 * exp(Q · days) by scaling and squaring; the Taylor series up to the 15th power in six products (Paterson &
 * Stockmeyer 1973).
 */
export function denseExp(generator: Dense, days: number): Dense {
  const { n, values } = generator;
  let norm = 0;
  for (let i = 0; i < n; i++) norm = Math.max(norm, 2 * Math.abs(values[i * n + i] ?? 0) * days);
  const halvings = Math.max(0, Math.ceil(Math.log2(Math.max(norm, 1e-300))));
  const a = combination([[days / 2 ** halvings, generator]]);
  const a2 = multiply(a, a);
  const powers = [identity(n), a, a2, multiply(a2, a)];
  const a4 = multiply(a2, a2);
  const group = (from: number) => combination(powers.map((matrix, i) => [TAYLOR[from + i] ?? 0, matrix] as const));
  let sum = group(12);
  for (const from of [8, 4, 0])
    sum = combination([
      [1, multiply(sum, a4)],
      [1, group(from)],
    ]);
  for (let i = 0; i < halvings; i++) sum = multiply(sum, sum);
  return sum;
}
