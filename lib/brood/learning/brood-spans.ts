/** What a look into a cell showed, as far as stages have ends: no brood yet, the three stages, or the adult out. */
export type StageSeen = 'none' | 'egg' | 'larva' | 'capped' | 'out';

/** One look into a cell. */
export interface StageLook {
  /** When, in days of the nest's development clock. */
  day: number;
  seen: StageSeen;
}

/** A stage with an end on both sides. */
export type LivingStage = 'egg' | 'larva' | 'capped';

/** Whole stages of one brood of which beginning and end were both caught between two looks. */
export interface BroodSpan {
  stages: LivingStage[];
  /** From the middle of the first interval to the middle of the last, days. */
  days: number;
  /** Lengths of the intervals in which it began and ended, days. */
  widths: [number, number];
}

const ORDER: readonly StageSeen[] = ['none', 'egg', 'larva', 'capped', 'out'];

/** A step from one stage to the next, caught between two looks. */
interface CaughtStep {
  /** The stage it leads into, by its place in the order. */
  into: number;
  middle: number;
  width: number;
}

const rank = (seen: StageSeen): number => ORDER.indexOf(seen);

/** Steps of broods in a cell; each list is one brood that never fell back or jumped over a stage. */
function stepRuns(looks: readonly StageLook[]): CaughtStep[][] {
  const runs: CaughtStep[][] = [[]];
  looks.slice(1).forEach((look, i) => {
    const before = looks[i];
    if (!before) return;
    const gained = rank(look.seen) - rank(before.seen);
    if (gained === 0) return;
    const step = { into: rank(look.seen), middle: (before.day + look.day) / 2, width: look.day - before.day };
    if (gained === 1) runs.at(-1)?.push(step);
    else runs.push([]);
  });
  return runs;
}

/** Whole stages that the looks into one cell enclose: for each brood the longest run of them. */
export function broodSpans(looks: readonly StageLook[]): BroodSpan[] {
  return stepRuns(looks).flatMap((run) => {
    const [first, last] = [run[0], run.at(-1)];
    if (!first || !last || first === last) return [];
    const stages = ORDER.slice(first.into, last.into).filter(
      (seen): seen is LivingStage => seen !== 'none' && seen !== 'out',
    );
    return [{ stages, days: last.middle - first.middle, widths: [first.width, last.width] }];
  });
}
