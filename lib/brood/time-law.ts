/** P(an event has happened by each time), times rising, in days since the first look. Straight between times. */
export interface TimeLaw {
  times: Float64Array;
  cdf: Float64Array;
}

/** First index whose value is at least `p`; the length when there is none. */
function firstAtLeast(values: Float64Array, p: number): number {
  let [low, high] = [0, values.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((values[middle] ?? 1) < p) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** The time by which a law reaches `p`. */
export function lawQuantile({ times, cdf }: TimeLaw, p: number): number {
  const i = firstAtLeast(cdf, p);
  if (i === 0) return times[0] ?? NaN;
  if (i >= cdf.length) return times.at(-1) ?? NaN;
  const [low, high] = [cdf[i - 1] ?? 0, cdf[i] ?? 1];
  const [before, after] = [times[i - 1] ?? NaN, times[i] ?? NaN];
  return before + ((p - low) / (high - low)) * (after - before);
}

/** P(happened by a time); 0 before the first time, and the last value after the last. */
export function lawAt({ times, cdf }: TimeLaw, time: number): number {
  const i = firstAtLeast(times, time);
  if (i === 0) return time < (times[0] ?? 0) ? 0 : (cdf[0] ?? 0);
  if (i >= times.length) return cdf.at(-1) ?? 0;
  const [before, after] = [times[i - 1] ?? 0, times[i] ?? 0];
  const [low, high] = [cdf[i - 1] ?? 0, cdf[i] ?? 0];
  return low + ((time - before) / (after - before)) * (high - low);
}

/** Mean and standard deviation, taking what lies between two times as spread evenly. */
export function lawSd({ times, cdf }: TimeLaw): number {
  let [total, first, second] = [0, 0, 0];
  for (let i = 1; i < times.length; i++) {
    const mass = (cdf[i] ?? 0) - (cdf[i - 1] ?? 0);
    const [from, to] = [times[i - 1] ?? 0, times[i] ?? 0];
    const middle = (from + to) / 2;
    total += mass;
    first += mass * middle;
    second += mass * (middle * middle + (to - from) ** 2 / 12);
  }
  if (total <= 0) return 0;
  const mean = first / total;
  return Math.sqrt(Math.max(0, second / total - mean * mean));
}

/** The earliest of several independent events: P(any has happened). `log` sums of log(1 − F). */
export function earliest(laws: readonly { law: TimeLaw; cells: number }[], times: Float64Array): Float64Array {
  const survival = new Float64Array(times.length);
  for (const { law, cells } of laws) {
    times.forEach((time, i) => {
      survival[i] = (survival[i] ?? 0) + cells * Math.log1p(-Math.min(1, lawAt(law, time)));
    });
  }
  return survival.map((log) => -Math.expm1(log));
}
