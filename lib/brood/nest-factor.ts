/**
 * Nodes and weights of 7-point Gauss–Hermite quadrature for ∫ f(x) exp(−x²) dx, non-negative half
 * (Abramowitz & Stegun 1964, table 25.10).
 */
const HERMITE_7: readonly (readonly [node: number, weight: number])[] = [
  [0, 0.8102646175568073],
  [0.816287882858964663, 0.4256072526101278],
  [1.673551628767471445, 0.0545155828191270305],
  [2.651961356835233492, 0.000971781245099519154],
];

/** The 7 nodes of a standard normal, smallest first, weights summing to 1. */
export function normalNodes(): { z: number; weight: number }[] {
  const half = HERMITE_7.map(([x, w]) => ({ z: Math.SQRT2 * x, weight: w / Math.sqrt(Math.PI) }));
  const mirrored = half.slice(1).map(({ z, weight }) => ({ z: -z, weight }));
  return [...mirrored.reverse(), ...half];
}
