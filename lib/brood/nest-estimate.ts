import { localDate } from '@/lib/kit/local-date';
import type { BroodFlag, DateRange, NestEstimate } from './answer';
import { datableBrood } from './cell-estimate';
import type { CellView } from './cell-history';
import { dateRange } from './date-range';
import { emergenceForecast } from './emergence-forecast';
import { datedGroups, emergenceAt, firstEmergenceLaw } from './first-emergence';
import { firstLaying } from './founding';
import type { DatedNest } from './nest-model/dated-nest';
import { factorPrior } from './nest-model/dated-nest';
import type { DurationRow } from './durations';
import { daysToEmergence, seasonGate } from './season';
import type { BroodSettings } from './settings';

/** What the nest's own numbers are made from. */
export interface NestInput {
  id: string;
  zone: string;
  asOf: number;
  views: readonly CellView[];
  settings: BroodSettings;
  row: DurationRow;
  /** Null when nobody looked into any cell. */
  dated: { nest: DatedNest; origin: number } | null;
}

/** At one look an adult had more likely than not just come out of a cell. */
const LIKELY = 0.5;

/** Have adults come out? An opened cell or one marked as reused says so, and so may the record of a cell. */
function isPastEmergence({ views, dated }: NestInput): boolean {
  const isSeen = views.some(({ looked }) => looked.some(({ mark }) => mark.state === 'opened' || mark.reused === true));
  return isSeen || (dated?.nest.groups.some(({ mixed }) => mixed.mostEmerged >= LIKELY) ?? false);
}

function expectedLosses(nest: DatedNest | undefined): NestEstimate['expectedLosses'] {
  const total = { egg: 0, larva: 0, capped: 0 };
  for (const group of nest?.groups ?? []) {
    const losses = datableBrood(group)?.losses;
    if (!losses) continue;
    total.egg += group.cells.length * losses.egg;
    total.larva += group.cells.length * losses.larva;
    total.capped += group.cells.length * losses.capped;
  }
  return total;
}

const P95 = 1.959963984540054;

function rateMultiplier({ dated, row, settings }: NestInput): NestEstimate['rateMultiplier'] {
  const { mean, sd } = dated?.nest.posterior.logRho ?? factorPrior(row, settings);
  return { median: Math.exp(mean), p95: [Math.exp(mean - P95 * sd), Math.exp(mean + P95 * sd)] };
}

function forecastOf({ dated, asOf, zone, settings }: NestInput): NestEstimate['emergencePerDay'] {
  const broods = dated ? datedGroups(dated.nest) : [];
  const nodes = (dated?.nest.posterior.nodes ?? []).map((node) => ({
    weight: node.weight,
    broods: broods.map((item) => ({ law: emergenceAt(node, item), cells: item.group.cells.length })),
  }));
  return emergenceForecast(nodes, {
    origin: dated?.origin ?? asOf,
    asOf,
    zone,
    days: settings.values.forecastSpan.value,
  });
}

/** The nest's own numbers: the earliest over its cells, averaged over the nest factor. */
export function nestEstimate(input: NestInput): NestEstimate {
  const { id, zone, asOf, settings, dated } = input;
  const isPast = isPastEmergence(input);
  const range = (law: ReturnType<typeof firstLaying>, shiftDays = 0): DateRange | null =>
    law && dated ? dateRange(law, { origin: dated.origin, zone, shiftDays }) : null;
  const firstEmergence = dated && !isPast ? range(firstEmergenceLaw(dated.nest)) : null;
  return {
    id,
    founded: dated && range(firstLaying(dated.nest), -settings.values.foundingLead.value),
    firstEmergence,
    emergencePerDay: forecastOf(input),
    rateMultiplier: rateMultiplier(input),
    season: seasonGate({ isPast, firstEmergence, today: localDate(asOf, zone) }, settings),
    expectedLosses: expectedLosses(dated?.nest),
  };
}

/** The flags about the nest as a whole. */
export function nestFlags(nest: NestEstimate, input: NestInput): BroodFlag[] {
  const { zone, asOf, views, settings } = input;
  if (isPastEmergence(input)) {
    return [{ code: 'past', text: 'Adults have come out already: first emergence is past and is not estimated.' }];
  }
  const days = daysToEmergence({ firstEmergence: nest.firstEmergence, today: localDate(asOf, zone) });
  if (days === null) return [{ code: 'nothing-dated', text: 'No living brood was seen, so nothing can be dated.' }];
  const window = settings.values.guardWindow.value;
  const isCapped = views.some(({ brood }) => brood?.group.key === 'capped');
  if (!isCapped || days > window) return [];
  const text = `Capped brood, and the first worker is estimated within ${window} days: guard it; moving needs the lead biologist's yes.`;
  return [{ code: 'guard', text }];
}
