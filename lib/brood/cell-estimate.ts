import type { CellEstimate, DateRange, EmergenceRange } from './answer';
import type { BroodSighting, CellView } from './cell-history';
import type { ClassLaw } from './class-law';
import { dateRange } from './date-range';
import { mixNodes } from './day-law';
import { type LossByStage, lossTotal } from './losses';
import type { FactorNode } from './nest-factor';

/** The dates of one living brood. */
export interface BroodDates {
  laid: DateRange;
  capped: DateRange;
  emerges: EmergenceRange;
  losses: LossByStage;
}

/** Averages how a brood ends over the nest factor. */
function mixedLosses({ losses }: ClassLaw, nodes: readonly FactorNode[]): LossByStage {
  const mix = (stage: keyof LossByStage) =>
    mixNodes(
      nodes,
      losses.map((byStage) => byStage[stage]),
    );
  return { egg: mix('egg'), larva: mix('larva'), capped: mix('capped') };
}

/** Dates a living brood from the law of its class. */
export function broodDates(
  { at }: BroodSighting,
  law: ClassLaw,
  { nodes, zone }: { nodes: readonly FactorNode[]; zone: string },
): BroodDates {
  const losses = mixedLosses(law, nodes);
  const { capping } = law;
  return {
    laid: dateRange(law.sinceLaid, { at, zone, direction: 'back' }),
    capped: dateRange(capping.law, { at, zone, direction: capping.isPast ? 'back' : 'on' }),
    emerges: { ...dateRange(law.untilOut, { at, zone, direction: 'on' }), probability: 1 - lossTotal(losses) },
    losses,
  };
}

/** Probability that the brood of a cell without a datable one was lost rather than an adult come out. */
function lostWithout({ looked, gone }: CellView, ofGone: LossByStage | null): number {
  const state = looked.at(-1)?.mark.state;
  if (state === 'dead' || state === 'parasitised') return 1;
  if (state !== 'empty' || !gone) return 0;
  return gone.group.key === 'capped' && ofGone ? lossTotal(ofGone) : 1;
}

/**
 * One cell of the answer.
 *
 * @param datesOf the dates of a living brood; shared between cells with equal records.
 */
export function cellEstimate(view: CellView, datesOf: (brood: BroodSighting) => BroodDates | null): CellEstimate {
  const { q, r, state, generation, brood, gone } = view;
  const dates = brood ? datesOf(brood) : null;
  if (dates) {
    const { laid, capped, emerges, losses } = dates;
    return { q, r, state, generation, laid, capped, emerges, lost: { probability: lossTotal(losses) } };
  }
  const ofGone = gone ? (datesOf(gone)?.losses ?? null) : null;
  return {
    q,
    r,
    state,
    generation,
    laid: null,
    capped: null,
    emerges: null,
    lost: { probability: lostWithout(view, ofGone) },
  };
}
