import { parseCellKey, ringOf } from '@/lib/comb/axial';
import type { DurationRow } from '@/lib/brood/durations';
import type { BroodSettings } from '@/lib/brood/settings';
import { type BroodModel, broodModel } from './brood-model';
import { type BuildingPrior, buildingPrior, combCurve, midRanks } from './building';
import { type CellLooks, likelihoods, looksText } from './cell-evidence';
import { type Future, futureOf } from './cell-outlook';
import { DEFAULT_CONFUSION } from './confusion';
import { type MixedGroup, mixedGroup } from './mixed-group';
import type { NestHistory } from './nest-history';
import { type FactorPrior, type NestPosterior, nestPosterior } from './nest-posterior';
import type { CellGroup } from './node-answer';
import { contradictoryRecords } from './contradiction';
import { type RateBetween, type Timeline, timelineOf } from './timeline';

/** How the nest's development clock runs. */
export interface NestClock {
  /** Mean rate between two days since the first look. */
  between: RateBetween;
  /** The clock runs evenly after this day. */
  end: number;
}

/** Equal cells with everything that is known of them. */
export interface DatedGroup {
  cells: readonly string[];
  looks: CellLooks;
  prior: BuildingPrior;
  /** Day of the last look. */
  lastLook: number;
  future: Future;
  mixed: MixedGroup;
  /** Only a slip of the hand explains the record. */
  isContradictory: boolean;
}

/** A nest with all its cells dated, times in days since the first look. */
export interface DatedNest {
  model: BroodModel;
  timeline: Timeline;
  posterior: NestPosterior;
  groups: readonly DatedGroup[];
}

/** Building priors by cell: by rank of the distance in cells from the pedicel cell among all cells seen. */
function priorsOf(history: NestHistory, timeline: Timeline, { values }: BroodSettings): Map<string, BuildingPrior> {
  const keys = [...history.cells.keys()];
  const curve = combCurve(history.counts, values.cellsPerDay.value);
  const firstCount = history.counts[0]?.cells ?? 0;
  const isGrowthSeen = history.counts.length >= 3;
  const ranks = midRanks(keys.map((key) => ringOf(parseCellKey(key))));
  const known = new Map<number, BuildingPrior>();
  return new Map(
    keys.map((key, i) => {
      const rank = ranks[i] ?? 1;
      const since = isGrowthSeen ? 0 : Math.max(0, firstCount - rank);
      const order = values.orderSpread.value + values.orderSpreadPerCell.value * rank;
      const spread = order + values.growthSpread.value * since;
      const prior =
        known.get(rank) ?? buildingPrior(timeline, curve, { rank, spread, slip: values.orderSlip.value / keys.length });
      known.set(rank, prior);
      return [key, prior];
    }),
  );
}

/** Cells with equal records and equal priors, in the order of their first cell. */
function grouped(history: NestHistory, priors: ReadonlyMap<string, BuildingPrior>) {
  const groups = new Map<string, { cells: string[]; looks: CellLooks; prior: BuildingPrior; record: string }>();
  for (const [cell, looks] of history.cells) {
    const prior = priors.get(cell);
    if (!prior) continue;
    const record = looksText(looks);
    const key = `${prior.key}|${record}`;
    const group = groups.get(key) ?? { cells: [], looks, prior, record };
    groups.set(key, group);
    group.cells.push(cell);
  }
  return [...groups.values()];
}

/** Prior of the nest factor: the settings' spread, or what the team's own nests of the taxon have shown. */
export function factorPrior(row: DurationRow, { values, durationFactors = [] }: BroodSettings): FactorPrior {
  const learnt = durationFactors.find(({ taxon }) => taxon.toLowerCase() === row.taxon.toLowerCase());
  if (learnt) return { mean: learnt.logMean, sd: learnt.logSd };
  return { mean: 0, sd: Math.sqrt(Math.log1p(values.nestFactorCv.value ** 2)) };
}

/** Days after which hardly any brood of the slowest nests is still inside. */
function horizonOf({ egg, larva, capped }: DurationRow, { mean, sd }: FactorPrior): number {
  return Math.min(400, 1.3 * (egg + larva + capped) * Math.exp(3 * sd - mean));
}

/** Dates every cell of a nest. */
export function datedNest(
  history: NestHistory,
  { row, settings, clock }: { row: DurationRow; settings: BroodSettings; clock: NestClock },
): DatedNest {
  const model = broodModel(row, settings, settings.confusion?.rows ?? DEFAULT_CONFUSION);
  const timeline = timelineOf(history.days, settings.values.priorSpan.value, clock.between);
  const factor = factorPrior(row, settings);
  const horizon = horizonOf(row, factor);
  const futures = history.days.map((day) => futureOf({ from: day, clockEnd: clock.end, horizon }, clock.between));
  const cells = grouped(history, priorsOf(history, timeline, settings));
  const floor = settings.values.slipFloor.value;
  const groups: CellGroup[] = cells.map((group) => ({
    record: group.record,
    prior: group.prior,
    seen: likelihoods(model, group.looks, floor),
    cells: group.cells.length,
  }));
  const posterior = nestPosterior(model, factor, { timeline, groups, futures });
  const records = cells.map((group, i) => ({ ...group, logLik: posterior.logLiks[i] ?? 0 }));
  const slips = contradictoryRecords(posterior.best, timeline, records);
  const dated = records.map((group, i): DatedGroup => {
    const { cells: keys, looks, prior } = group;
    const lastLook = history.days[looks.length - 1] ?? 0;
    const future =
      futures[looks.length - 1] ?? futureOf({ from: lastLook, clockEnd: clock.end, horizon }, clock.between);
    const mixed = mixedGroup(model, { nodes: posterior.nodes, group: i }, { edges: timeline.edges, lastLook, future });
    return { cells: keys, looks, prior, lastLook, future, mixed, isContradictory: slips.has(group) };
  });
  return { model, timeline, posterior, groups: dated };
}
