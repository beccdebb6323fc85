import { type CellView, generations } from './cell-history';
import type { ClassLaw } from './class-law';
import { type DayLaw, quantileDays } from './day-law';
import { DAY_MS } from './date-range';
import { type StageGroup, stageGroup } from './stages';

/** A sighting that says how long ago the first egg of a cell was laid. */
export interface FoundingEvidence {
  at: number;
  sinceLaid: DayLaw;
  /** The adult was out already, so the egg was laid at that time or earlier. */
  isBound: boolean;
}

/** A first brood seen: alive in a group of stages, or out of its cell. */
interface FirstSighting {
  at: number;
  group: StageGroup | null;
}

/** The sightings of first broods in one cell: living ones, and an opened cell as the end of one. */
function firstBrood({ looked }: CellView): FirstSighting[] {
  const order = generations(looked);
  return looked
    .filter((_, i) => (order[i] ?? 0) <= 1)
    .map(({ at, mark }) => ({ at, group: stageGroup(mark), isOut: mark.state === 'opened' }))
    .filter(({ group, isOut }) => group !== null || isOut);
}

/**
 * The sighting that dates the founding: the one whose egg was laid earliest by its median, over all cells and
 * readings. Cells that were used again count with their first brood only, so reuse never moves the founding.
 *
 * @param whole gives the law of the whole development; asked for only when there is an opened cell.
 */
export function foundingEvidence(
  views: readonly CellView[],
  laws: ReadonlyMap<string, ClassLaw>,
  whole: () => DayLaw,
): FoundingEvidence | null {
  const sightings = views.flatMap(firstBrood);
  const ofOpened = sightings.some(({ group }) => group === null) ? whole() : undefined;
  let best: FoundingEvidence | null = null;
  let earliest = Infinity;
  for (const { at, group } of sightings) {
    const sinceLaid = group ? laws.get(group.key)?.sinceLaid : ofOpened;
    if (!sinceLaid) continue;
    const laid = at - quantileDays(sinceLaid.mixed, 0.5) * DAY_MS;
    if (laid >= earliest) continue;
    earliest = laid;
    best = { at, sinceLaid, isBound: group === null };
  }
  return best;
}
