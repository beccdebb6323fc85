import { cellKey } from '@/lib/comb/axial';
import { localDate } from '@/lib/kit/local-date';
import type { BroodEstimate, BroodFlag } from './answer';
import { assumptionTexts } from './assumptions';
import { cellEstimate, groupEstimate } from './cell-estimate';
import { cellFlags } from './cell-flags';
import { type CellView, cellHistories, readingsUntil, viewCell } from './cell-history';
import { type DurationChoice, durationsFor } from './durations';
import { datedGroups } from './first-emergence';
import type { BroodInput, BroodReading } from './input';
import { inputText } from './input-text';
import { nestClock } from './nest-clock';
import { nestEstimate, nestFlags } from './nest-estimate';
import { type DatedNest, datedNest } from './nest-model/dated-nest';
import { nestHistory } from './nest-model/nest-history';
import { type BroodSettings, DEFAULT_SETTINGS } from './settings';
import { type DevelopmentClock, developmentClock } from './temperature/development-clock';
import { temperatureSettings } from './temperature/temperature-settings';
import { temperatureAnswer, temperatureFlags } from './temperature-answer';
import { lawQuantile, lawSd } from './time-law';

/** Names the method in every answer. */
const BROOD_MODEL = { name: 'hmm', version: '2.0' } as const;

/** What an estimate is made from, looked up and put in order. */
interface Prepared {
  settings: BroodSettings;
  choice: DurationChoice;
  /** Oldest first. */
  readings: readonly BroodReading[];
  clock: DevelopmentClock;
}

function prepared(input: BroodInput): Prepared {
  const settings = input.settings ?? DEFAULT_SETTINGS;
  const choice = durationsFor(input.taxon, settings.durations);
  const heat = temperatureSettings(settings.values, choice.row.referenceC);
  const place = { zone: input.zone, place: input.place ?? null };
  return {
    settings,
    choice,
    readings: readingsUntil(input.readings, input.asOf),
    clock: developmentClock(input.temperature ?? null, heat, place),
  };
}

/** Dates the nest, or null when nobody looked into any cell. */
function datedFrom({ settings, choice, readings, clock }: Prepared, asOf: number) {
  const history = nestHistory(readings);
  if (!history) return null;
  const { origin } = history;
  const nest = datedNest(history, {
    row: choice.row,
    settings,
    clock: nestClock(clock.rates, { origin, until: asOf }),
  });
  return { nest, origin };
}

/** How much the readings narrow the laying date of the brood that comes out first, against where the cell lies. */
function informationOf(nest: DatedNest | undefined, { values }: BroodSettings): BroodEstimate['information'] {
  const nothing = values.priorSpan.value / Math.sqrt(12);
  const due = nest ? datedGroups(nest).map(({ group }) => group) : [];
  const [first] = due.sort((a, b) => outAt(a.mixed.present) - outAt(b.mixed.present));
  if (!nest || !first?.mixed.present) return { priorSd: nothing, posteriorSd: nothing };
  const built = lawSd({ times: nest.timeline.edges, cdf: first.prior.absent.map((p) => 1 - p) });
  return {
    priorSd: Math.hypot(built, 1 / values.layFirst.value),
    posteriorSd: lawSd(first.mixed.present.laid),
  };
}

function outAt(brood: DatedNest['groups'][number]['mixed']['present']): number {
  return brood ? lawQuantile(brood.out, 0.5) : Infinity;
}

function inputFlags({ choice, clock }: Prepared): BroodFlag[] {
  const genus: BroodFlag = {
    code: 'other-genus',
    text: 'These durations are for Polistes; for another genus the dates are a guess.',
  };
  return [...(choice.match === 'other-genus' ? [genus] : []), ...temperatureFlags(clock)];
}

/** Records that only a slip explains; nothing is refused for it. */
function contradictions(nest: DatedNest | undefined, views: readonly CellView[]): BroodFlag[] {
  const cells = new Set(nest?.groups.filter((group) => group.isContradictory).flatMap((group) => group.cells) ?? []);
  return views
    .filter((view) => cells.has(cellKey(view)))
    .map(({ q, r }) => ({
      cell: { q, r },
      code: 'contradictory',
      text: 'No life of one cell gives these looks one after another: at least one of them slipped. Dates are the least unlikely ones.',
    }));
}

function digestOf(input: BroodInput, { settings, choice, readings, clock }: Prepared): string {
  const text = inputText({
    model: BROOD_MODEL,
    settings,
    row: choice.row,
    zone: input.zone,
    asOfDate: localDate(input.asOf, input.zone),
    rates: clock.rates.filter(([from]) => from < input.asOf),
    taxon: input.taxon,
    readings,
  });
  return input.digest ? input.digest(text) : text;
}

/** The members of the answer that only repeat what went in. */
function frontMatter(input: BroodInput, { settings, choice, readings, clock }: Prepared) {
  const { taxon, egg, larva, capped, referenceC, trust, source } = choice.row;
  return {
    asOf: new Date(input.asOf).toISOString(),
    zone: input.zone,
    model: { ...BROOD_MODEL },
    settings: { version: settings.version },
    durations: { taxon, egg, larva, capped, referenceC, trust, source },
    temperature: temperatureAnswer(clock, input.zone),
    readings: readings.map(({ id }) => id),
  };
}

/** The digest an estimate of this input carries, without making it; the digest function of the input shortens it. */
export function estimateDigest(input: BroodInput): string {
  return digestOf(input, prepared(input));
}

/**
 * Estimates when the brood of a nest was laid, is capped and comes out, from what the cells were seen to hold.
 *
 * Each cell is a hidden Markov chain in continuous time whose stages are rows of equal phases; all looks into it, the
 * place of the cell on the comb and a factor shared by the nest are taken together exactly (uniformisation, forward and
 * backward passes, adaptive Gauss–Hermite quadrature; no chance). It needs no clock and no network, so it runs the same
 * in the phone and on the server.
 *
 * @returns ranges, never bare dates; equal inputs give equal answers.
 */
export function estimateNest(input: BroodInput): BroodEstimate {
  const ready = prepared(input);
  const { settings, choice, readings } = ready;
  const views = cellHistories(readings).map(viewCell);
  const dated = datedFrom(ready, input.asOf);
  const { nest: id, zone, asOf } = input;
  const nestInput = { id, zone, asOf, views, settings, row: choice.row, dated };
  const nest = nestEstimate(nestInput);
  const shared = new Map(
    (dated?.nest.groups ?? []).flatMap((group) => {
      const estimate = groupEstimate(group, { origin: dated?.origin ?? asOf, zone });
      return group.cells.map((cell) => [cell, estimate] as const);
    }),
  );
  return {
    ...frontMatter(input, ready),
    inputDigest: digestOf(input, ready),
    cells: views.map((view) => cellEstimate(view, shared.get(cellKey(view)))),
    nest,
    flags: [
      ...nestFlags(nest, nestInput),
      ...views.flatMap((view) => cellFlags(view, { row: choice.row, settings }, zone)),
      ...contradictions(dated?.nest, views),
      ...inputFlags(ready),
    ],
    assumptions: assumptionTexts({
      choice,
      settings,
      unsureCells: views.filter(({ looked }) => looked.at(-1)?.mark.unsure).length,
      clock: ready.clock.kind,
    }),
    information: informationOf(dated?.nest, settings),
  };
}
