import type { DatedNest } from './nest-model/dated-nest';
import { cumulated } from './nest-model/mixed-group';
import { type TimeLaw, earliest } from './time-law';

const EMPTY: ReadonlySet<string> = new Set(['absent', 'empty']);

/** Was there ever anything in a cell that begins with an egg? */
function isBroodSeen({ groups }: DatedNest): boolean {
  return groups.some(({ looks }) => looks.some((atVisit) => atVisit.some(({ state }) => !EMPTY.has(state))));
}

/**
 * When the first egg of the nest was laid: the earliest over all cells, which are independent of each other given the
 * nest factor; then averaged over it. Cells that were used again count with their first egg.
 *
 * @returns null when no brood was ever seen.
 */
export function firstLaying(nest: DatedNest): TimeLaw | null {
  const { timeline, posterior, groups } = nest;
  if (!isBroodSeen(nest)) return null;
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
  return total > 0 ? { times, cdf: cdf.map((p) => p / total) } : null;
}
