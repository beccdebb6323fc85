/** Probabilities of `first`, `first + 1`, … events; what is left out is negligible. */
export interface PoissonWeights {
  first: number;
  weights: Float64Array;
}

const NEGLIGIBLE = 1e-17;

/** How many values on each side of the mode are not negligible. */
function reach(mean: number, mode: number, least: number): { below: number; above: number } {
  let below = 0;
  for (let ratio = 1; below < mode && ratio > least; below++) ratio *= (mode - below) / mean;
  let above = 0;
  for (let ratio = 1; ratio > least; above++) ratio *= mean / (mode + above + 1);
  return { below, above };
}

/**
 * Poisson probabilities, built outwards from the mode and divided by their sum: no factorial, no exponential of a
 * large number, so the relative error stays near machine precision for any mean.
 *
 * @param mean expected number of events, at least 0.
 * @param least events with less than this share of the most likely one are left out.
 */
export function poissonWeights(mean: number, least = NEGLIGIBLE): PoissonWeights {
  if (mean <= 0) return { first: 0, weights: Float64Array.of(1) };
  const mode = Math.floor(mean);
  const { below, above } = reach(mean, mode, least);
  const first = mode - below;
  const weights = new Float64Array(below + above + 1);
  weights[below] = 1;
  for (let i = below; i > 0; i--) weights[i - 1] = ((weights[i] ?? 0) * (first + i)) / mean;
  for (let i = below; i < below + above; i++) weights[i + 1] = ((weights[i] ?? 0) * mean) / (first + i + 1);
  let total = 0;
  for (let i = 0; i < weights.length; i++) total += weights[i] ?? 0;
  for (let i = 0; i < weights.length; i++) weights[i] = (weights[i] ?? 0) / total;
  return { first, weights };
}

/**
 * Averages a sequence over a Poisson number of steps.
 *
 * @param sequence value after 0, 1, 2, … steps; beyond its end the last value holds.
 */
export function poissonMean(sequence: Float64Array, { first, weights }: PoissonWeights): number {
  const last = sequence.length - 1;
  const within = Math.min(weights.length, Math.max(0, last - first));
  let [sum, mass] = [0, 0];
  for (let i = 0; i < within; i++) sum += (weights[i] ?? 0) * (sequence[first + i] ?? 0);
  const held = sequence[last] ?? 0;
  if (held === 0) return sum;
  for (let i = within; i < weights.length; i++) mass += weights[i] ?? 0;
  return sum + mass * held;
}

/** Averages a sequence over each of several Poisson laws. */
export function poissonMeans(sequence: Float64Array, laws: readonly PoissonWeights[]): Float64Array {
  const means = new Float64Array(laws.length);
  for (let i = 0; i < means.length; i++) {
    const law = laws[i];
    if (law) means[i] = poissonMean(sequence, law);
  }
  return means;
}
