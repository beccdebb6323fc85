import { localDate } from '@/lib/kit/local-date';
import type { BroodFlag, NestEstimate } from './answer';
import type { BroodSighting, CellView } from './cell-history';
import type { ClassLaw, NestModel } from './class-law';
import { mixNodes, quantileDays } from './day-law';
import { DAY_MS, dateRange } from './date-range';
import { type BroodCount, emergenceForecast } from './emergence-forecast';
import type { FoundingEvidence } from './founding';
import { logSd } from './nest-factor';
import { daysToEmergence, seasonGate } from './season';

/** What the nest's own numbers are made from. */
export interface NestInput {
  id: string;
  zone: string;
  asOf: number;
  views: readonly CellView[];
  laws: ReadonlyMap<string, ClassLaw>;
  model: NestModel;
  founding: FoundingEvidence | null;
}

/** Have adults come out? An opened cell or one marked as reused says so, in any reading. */
function isPastEmergence(views: readonly CellView[]): boolean {
  return views.some(({ looked }) => looked.some(({ mark }) => mark.state === 'opened' || mark.reused === true));
}

/** The living broods of the comb, equal ones counted together. */
export function countBroods(views: readonly CellView[], laws: ReadonlyMap<string, ClassLaw>): BroodCount[] {
  const counts = new Map<string, BroodCount>();
  for (const { brood } of views) {
    const law = brood ? laws.get(brood.group.key) : undefined;
    if (!brood || !law) continue;
    const key = `${brood.group.key}@${brood.at}`;
    const known = counts.get(key);
    counts.set(key, { brood, law, cells: (known?.cells ?? 0) + 1 });
  }
  return [...counts.values()];
}

/** The brood that comes out first by its median. */
export function mostAdvanced(broods: readonly BroodCount[]): { brood: BroodSighting; law: ClassLaw } | null {
  const due = ({ brood, law }: BroodCount) => brood.at + quantileDays(law.untilOut.mixed, 0.5) * DAY_MS;
  return broods.reduce<BroodCount | null>((best, next) => (best && due(best) <= due(next) ? best : next), null);
}

function expectedLosses(broods: readonly BroodCount[], { nodes }: NestModel): NestEstimate['expectedLosses'] {
  const total = (stage: 'egg' | 'larva' | 'capped') =>
    broods.reduce(
      (sum, { law, cells }) =>
        sum +
        cells *
          mixNodes(
            nodes,
            law.losses.map((byStage) => byStage[stage]),
          ),
      0,
    );
  return { egg: total('egg'), larva: total('larva'), capped: total('capped') };
}

/** The nest's own numbers: those of its most advanced brood, not a product over cells. */
export function nestEstimate({ id, zone, asOf, views, laws, model, founding }: NestInput): NestEstimate {
  const { nodes, settings } = model;
  const { foundingLead, forecastSpan, nestFactorCv } = settings.values;
  const isPast = isPastEmergence(views);
  const broods = countBroods(views, laws);
  const first = mostAdvanced(broods);
  const firstEmergence =
    first && !isPast ? dateRange(first.law.untilOut, { at: first.brood.at, zone, direction: 'on' }) : null;
  const shiftDays = -foundingLead.value;
  const band = Math.exp(1.959963984540054 * logSd(nestFactorCv.value));
  return {
    id,
    founded: founding && dateRange(founding.sinceLaid, { at: founding.at, zone, direction: 'back', shiftDays }),
    firstEmergence,
    emergencePerDay: emergenceForecast(broods, { nodes, asOf, zone, days: forecastSpan.value }),
    rateMultiplier: { median: 1, p95: [1 / band, band] },
    season: seasonGate({ isPast, firstEmergence, today: localDate(asOf, zone) }, settings),
    expectedLosses: expectedLosses(broods, model),
  };
}

/** The flags about the nest as a whole. */
export function nestFlags(nest: NestEstimate, { zone, asOf, views, model }: NestInput): BroodFlag[] {
  if (isPastEmergence(views)) {
    return [{ code: 'past', text: 'Adults have come out already: first emergence is past and is not estimated.' }];
  }
  const days = daysToEmergence({ firstEmergence: nest.firstEmergence, today: localDate(asOf, zone) });
  if (days === null) return [{ code: 'nothing-dated', text: 'No living brood was seen, so nothing can be dated.' }];
  const window = model.settings.values.guardWindow.value;
  const isCapped = views.some(({ brood }) => brood?.group.key === 'capped');
  if (!isCapped || days > window) return [];
  const text = `Capped brood, and the first worker is estimated within ${window} days: guard it; moving needs the lead biologist's yes.`;
  return [{ code: 'guard', text }];
}
