/** A distribution that has all its mass between two points. */
interface Law {
  cdf: (x: number) => number;
  from: number;
  to: number;
}

/** Nodes and weights of 5-point Gauss–Legendre quadrature on [−1, 1] (Abramowitz & Stegun 1964, table 25.4). */
const LEGENDRE_5 = [
  [-0.906179845938664, 0.23692688505618908],
  [-0.5384693101056831, 0.47862867049936647],
  [0, 0.5688888888888889],
  [0.5384693101056831, 0.47862867049936647],
  [0.906179845938664, 0.23692688505618908],
] as const;

const PANELS = 200;

function integrate(f: (x: number) => number, from: number, to: number): number {
  const half = (to - from) / PANELS / 2;
  let sum = 0;
  for (let panel = 0; panel < PANELS; panel++) {
    const centre = from + (2 * panel + 1) * half;
    for (const [node, weight] of LEGENDRE_5) sum += weight * half * f(centre + node * half);
  }
  return sum;
}

/** Continuous ranked probability score: ∫ (F(x) − 1{x ≥ y})² dx, split at y. */
export function crps({ cdf, from, to }: Law, y: number): number {
  const split = Math.min(to, Math.max(from, y));
  return integrate((x) => cdf(x) ** 2, from, split) + integrate((x) => (1 - cdf(x)) ** 2, split, to);
}
