import type { FactorNode } from './nest-factor';
import type { PhaseChain } from './phase-chain';

/** Mean and standard deviation of a time, in days. */
interface Moments {
  mean: number;
  sd: number;
}

/**
 * Mean and standard deviation of the time spent since phase `from` was entered, seen in the phases of `weights`.
 * For one stage of k phases and mean m the mean is m (1 + 1/k) / 2, the inspection paradox (Cox 1962).
 *
 * @param nodes values of the nest factor; a faster nest has spent less time.
 */
export function elapsedMoments(
  chain: PhaseChain,
  { from, weights }: { from: number; weights: Float64Array },
  nodes: readonly FactorNode[],
): Moments {
  let [first, second, elapsed, variance] = [0, 0, 0, 0];
  chain.rates.forEach((rate, i) => {
    if (i < from) return;
    elapsed += 1 / rate;
    variance += 1 / (rate * rate);
    first += (weights[i] ?? 0) * elapsed;
    second += (weights[i] ?? 0) * (variance + elapsed * elapsed);
  });
  const mean = first * nodes.reduce((sum, { rate, weight }) => sum + weight / rate, 0);
  const square = second * nodes.reduce((sum, { rate, weight }) => sum + weight / (rate * rate), 0);
  return { mean, sd: Math.sqrt(square - mean * mean) };
}
