import { localDate } from '@/lib/kit/local-date';
import type { BroodEstimate, BroodFlag } from './answer';
import { assumptionTexts } from './assumptions';
import { type BroodDates, broodDates, cellEstimate } from './cell-estimate';
import { cellFlags } from './cell-flags';
import { type BroodSighting, type CellView, cellHistories, readingsUntil, viewCell } from './cell-history';
import type { ClassLaw, NestModel } from './class-law';
import { type DurationChoice, durationsFor } from './durations';
import { foundingEvidence } from './founding';
import type { BroodInput, BroodReading } from './input';
import { inputText } from './input-text';
import { lawBookFor } from './law-book';
import { elapsedMoments } from './moments';
import { countBroods, mostAdvanced, nestEstimate, nestFlags } from './nest-estimate';
import { equilibriumWeights, phasesOf } from './phase-chain';
import { type BroodSettings, DEFAULT_SETTINGS } from './settings';
import { type StageGroup, stageGroup } from './stages';

/** Names the method in every answer. */
const BROOD_MODEL = { name: 'single-sighting', version: '1.0' } as const;

/** Every class that any look shows, once each. */
function groupsSeen(views: readonly CellView[]): StageGroup[] {
  const groups = views.flatMap(({ looked }) => looked.map(({ mark }) => stageGroup(mark)));
  return [...new Map(groups.flatMap((group) => (group ? [[group.key, group] as const] : []))).values()];
}

/** Dates broods, working each class and time out once. */
function sharedDates(laws: ReadonlyMap<string, ClassLaw>, { nodes }: NestModel, zone: string) {
  const known = new Map<string, BroodDates>();
  return (brood: BroodSighting): BroodDates | null => {
    const law = laws.get(brood.group.key);
    if (!law) return null;
    const key = `${brood.group.key}@${brood.at}`;
    const dates = known.get(key) ?? broodDates(brood, law, { nodes, zone });
    known.set(key, dates);
    return dates;
  };
}

/** How much the readings narrow the laying date of the most advanced brood, against a flat prior. */
function informationOf(
  views: readonly CellView[],
  laws: ReadonlyMap<string, ClassLaw>,
  { chain, nodes, settings }: NestModel,
) {
  const priorSd = settings.values.priorSpan.value / Math.sqrt(12);
  const best = mostAdvanced(countBroods(views, laws));
  if (!best) return { priorSd, posteriorSd: priorSd };
  const weights = equilibriumWeights(chain, phasesOf(chain, best.brood.group));
  return { priorSd, posteriorSd: elapsedMoments(chain, { from: 0, weights }, nodes).sd };
}

function inputFlags({ match }: DurationChoice, hasTemperature: boolean): BroodFlag[] {
  const flags: BroodFlag[] = [];
  if (match === 'other-genus') {
    flags.push({
      code: 'other-genus',
      text: 'These durations are for Polistes; for another genus the dates are a guess.',
    });
  }
  if (hasTemperature) {
    flags.push({
      code: 'temperature-unused',
      text: 'There is a temperature record; this model version does not use it yet.',
    });
  }
  return flags;
}

function digestOf(
  input: BroodInput,
  used: { readings: readonly BroodReading[]; settings: BroodSettings; choice: DurationChoice },
): string {
  const text = inputText({
    model: BROOD_MODEL,
    settings: used.settings,
    row: used.choice.row,
    zone: input.zone,
    asOfDate: localDate(input.asOf, input.zone),
    hasTemperature: input.hasTemperature ?? false,
    taxon: input.taxon,
    readings: used.readings,
  });
  return input.digest ? input.digest(text) : text;
}

/** The members of the answer that only repeat what went in. */
function frontMatter(input: BroodInput, readings: readonly BroodReading[], { row }: DurationChoice) {
  const { taxon, egg, larva, capped, referenceC, trust, source } = row;
  return {
    asOf: new Date(input.asOf).toISOString(),
    zone: input.zone,
    model: { ...BROOD_MODEL },
    durations: { taxon, egg, larva, capped, referenceC, trust, source },
    temperature: {
      kind: 'none' as const,
      from: null,
      to: null,
      note: 'No temperature record is used: days are calendar days.',
    },
    readings: readings.map(({ id }) => id),
  };
}

/**
 * Estimates when the brood of a nest was laid, is capped and comes out, from what the cells were seen to hold.
 *
 * This first method dates each cell by its last look alone (the exact law of one sighting, methods of renewal theory,
 * Cox 1962), mixed over a factor shared by the nest. It needs no clock, no randomness and no network, so it runs the
 * same in the phone and on the server.
 *
 * @returns ranges, never bare dates; equal inputs give equal answers.
 */
export function estimateNest(input: BroodInput): BroodEstimate {
  const settings = input.settings ?? DEFAULT_SETTINGS;
  const choice = durationsFor(input.taxon, settings.durations);
  const book = lawBookFor(choice.row, settings);
  const { model } = book;
  const readings = readingsUntil(input.readings, input.asOf);
  const views = cellHistories(readings).map(viewCell);
  const laws = book.classesOf(groupsSeen(views));
  const founding = foundingEvidence(views, laws, book.whole);
  const datesOf = sharedDates(laws, model, input.zone);
  const nestInput = { id: input.nest, zone: input.zone, asOf: input.asOf, views, laws, model, founding };
  const nest = nestEstimate(nestInput);
  return {
    ...frontMatter(input, readings, choice),
    settings: { version: settings.version },
    inputDigest: digestOf(input, { readings, settings, choice }),
    cells: views.map((view) => cellEstimate(view, datesOf)),
    nest,
    flags: [
      ...nestFlags(nest, nestInput),
      ...views.flatMap((view) => cellFlags(view, model, input.zone)),
      ...inputFlags(choice, input.hasTemperature ?? false),
    ],
    assumptions: assumptionTexts({
      choice,
      settings,
      unsureCells: views.filter(({ looked }) => looked.at(-1)?.mark.unsure).length,
      hasHistory: readings.length > 1,
      isFoundingBound: founding?.isBound ?? false,
    }),
    information: informationOf(views, laws, model),
  };
}
