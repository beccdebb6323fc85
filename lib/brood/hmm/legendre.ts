/** Nodes and weights of 5-point Gauss–Legendre quadrature on [0, 1] (Abramowitz & Stegun 1964, table 25.4). */
const LEGENDRE_5: readonly (readonly [node: number, weight: number])[] = [
  [0.046910077030668, 0.11846344252809454],
  [0.23076534494715845, 0.23931433524968324],
  [0.5, 0.28444444444444444],
  [0.7692346550528415, 0.23931433524968324],
  [0.953089922969332, 0.11846344252809454],
];

/** One point of a quadrature: ∫ f ≈ Σ weight · f(at). */
export interface QuadraturePoint {
  at: number;
  weight: number;
}

/** Points for the integral over a span, in panels no longer than `longest`. */
export function quadrature({ from, to }: { from: number; to: number }, longest: number): QuadraturePoint[] {
  const panels = Math.max(1, Math.ceil((to - from) / longest));
  const length = (to - from) / panels;
  return Array.from({ length: panels }, (_, i) => i).flatMap((i) =>
    LEGENDRE_5.map(([node, weight]) => ({ at: from + (i + node) * length, weight: weight * length })),
  );
}
