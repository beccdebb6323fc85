import { datableBrood } from './cell-estimate';
import type { DatedGroup, DatedNest } from './nest-model/dated-nest';
import type { PosteriorNode } from './nest-model/nest-posterior';
import { type TimeLaw, earliest } from './time-law';

/** The groups whose brood is dated, with their number among all groups. */
export function datedGroups({ groups }: DatedNest): { group: DatedGroup; index: number }[] {
  return groups.map((group, index) => ({ group, index })).filter(({ group }) => datableBrood(group) !== null);
}

/** When the adult of a group comes out, at one value of the nest factor; ends below 1 by what is lost. */
export function emergenceAt(
  { groups }: PosteriorNode,
  { group, index }: { group: DatedGroup; index: number },
): TimeLaw {
  const times = group.future.times.map((time) => time + group.lastLook);
  return { times, cdf: groups[index]?.outlook?.out ?? new Float64Array(times.length) };
}

/**
 * When the first adult of the brood now in the comb comes out: the earliest over its cells within each value of the
 * nest factor, then averaged; given that any does.
 */
export function firstEmergenceLaw(nest: DatedNest): TimeLaw | null {
  const dated = datedGroups(nest);
  const [oldest] = [...dated].sort((a, b) => a.group.lastLook - b.group.lastLook);
  if (!oldest) return null;
  const times = oldest.group.future.times.map((time) => time + oldest.group.lastLook);
  const cdf = new Float64Array(times.length);
  for (const node of nest.posterior.nodes) {
    const laws = dated.map((item) => ({ law: emergenceAt(node, item), cells: item.group.cells.length }));
    earliest(laws, times).forEach((p, i) => {
      cdf[i] = (cdf[i] ?? 0) + node.weight * p;
    });
  }
  const total = cdf.at(-1) ?? 0;
  return total > 0 ? { times, cdf: cdf.map((p) => p / total) } : null;
}
