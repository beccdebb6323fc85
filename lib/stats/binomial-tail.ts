function logChoose(n: number, x: number): number {
  let total = 0;
  for (let i = 1; i <= x; i += 1) total += Math.log((n - x + i) / i);
  return total;
}

/**
 * P(X ≥ x) for X binomial, counting P(X = x) with the given weight: 1 for the exact tail, ½ for mid-P.
 *
 * @param n number of tries.
 * @param share probability of a success, strictly between 0 and 1.
 * @param at `x` where the tail begins, and the `weight` of that value itself.
 */
export function binomialTail(n: number, share: number, at: { x: number; weight: number }): number {
  let total = 0;
  let logTerm = logChoose(n, at.x) + at.x * Math.log(share) + (n - at.x) * Math.log1p(-share);
  for (let x = at.x; x <= n; x += 1) {
    total += Math.exp(logTerm) * (x === at.x ? at.weight : 1);
    logTerm += Math.log(((n - x) / (x + 1)) * (share / (1 - share)));
  }
  return total;
}
