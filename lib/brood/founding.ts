import type { DatedNest } from './nest-model/dated-nest';
import { cumulated } from './nest-model/mixed-group';
import { type TimeLaw, earliest } from './time-law';

/** Less likely than this, no egg was ever laid in the nest. */
const LIKELY = 0.5;

/**
 * When the first egg of the nest was laid: the earliest over all cells, which are independent of each other given the
 * nest factor; then averaged over it. Cells that were used again count with their first egg.
 *
 * @returns null when most likely no egg was laid yet.
 */
export function firstLaying({ timeline, posterior, groups }: DatedNest): TimeLaw | null {
  const times = timeline.edges;
  const cdf = new Float64Array(times.length);
  for (const { weight, groups: answers } of posterior.nodes) {
    const laws = groups.map(({ cells }, i) => ({
      law: { times, cdf: cumulated(answers[i]?.first ?? new Float64Array(times.length - 1)) },
      cells: cells.length,
    }));
    earliest(laws, times).forEach((p, i) => {
      cdf[i] = (cdf[i] ?? 0) + weight * p;
    });
  }
  const total = cdf.at(-1) ?? 0;
  return total >= LIKELY ? { times, cdf: cdf.map((p) => p / total) } : null;
}
