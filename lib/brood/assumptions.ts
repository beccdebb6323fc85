import type { DurationChoice } from './durations';
import type { BroodSettings } from './settings';
import type { DevelopmentClock } from './temperature/development-clock';

/** What the texts depend on. */
interface AssumptionInput {
  choice: DurationChoice;
  settings: BroodSettings;
  /** Cells of the present view that were marked unsure. */
  unsureCells: number;
  /** What the development clock runs by. */
  clock: DevelopmentClock['kind'];
}

const percent = (value: number): string => `${Math.round(value * 100)} %`;
const days = (value: number): string => String(Math.round(value * 100) / 100);

function durationText({ row, match }: DurationChoice): string {
  const whose = match === 'exact' ? row.taxon : `${row.taxon} (no figures for this taxon itself)`;
  return (
    `${whose}: egg ${days(row.egg)}, larva ${days(row.larva)}, capped ${days(row.capped)} days at ${row.referenceC} °C ` +
    `in the nest. Trust: ${row.trust}. Source: ${row.source}. The source gives no temperature; ${row.referenceC} °C is assumed.`
  );
}

function totalText({ row }: DurationChoice): string[] {
  const sum = row.egg + row.larva + row.capped;
  if (row.publishedTotal === undefined || Math.abs(sum - row.publishedTotal) < 0.05) return [];
  return [
    `The stages add up to ${days(sum)} days, while the same source prints ${days(row.publishedTotal)} for the whole.`,
  ];
}

function spreadText({ values }: BroodSettings): string {
  return (
    `Individuals differ: egg ${percent(values.cvEgg.value)}, each larval instar ${percent(values.cvInstar.value)}, ` +
    `capped ${percent(values.cvCapped.value)}. Whole nests differ by ${percent(values.nestFactorCv.value)}, all cells together.`
  );
}

function lossText({ values }: BroodSettings): string {
  return (
    `Losses per day: eggs ${values.lossEgg.value}, larvae ${values.lossLarva.value}, capped ${values.lossCapped.value}. ` +
    'Lost brood is replaced, and emptied cells are laid in again.'
  );
}

/** Where the comb order and the development clock come from. */
function clockText({ values }: BroodSettings, clock: DevelopmentClock['kind']): string {
  if (clock === 'none') return 'No temperature record is used: days are calendar days.';
  const { heatBase, heatPlateau, heatLimit } = values;
  return (
    `Development follows the ${clock === 'logger' ? 'logger at the nest' : 'daily lowest and highest temperatures'}: ` +
    `nothing below ${days(heatBase.value)} °C, no faster above ${days(heatPlateau.value)} °C, nothing above ${days(heatLimit.value)} °C. ` +
    'Losses and laying run on calendar days.'
  );
}

function confusionText({ confusion, values }: BroodSettings): string {
  const whose = confusion
    ? `Readers err as ${confusion.source} shows (trust: ${confusion.trust}).`
    : 'Readers err as assumed: mostly between neighbouring classes, an egg missed in 5 of 100 looks.';
  return `${whose} A look marked unsure errs twice as often; ${values.slipFloor.value} of all looks may mean anything.`;
}

function factorTexts({ row }: DurationChoice, { durationFactors = [] }: BroodSettings): string[] {
  const learnt = durationFactors.find(({ taxon }) => taxon.toLowerCase() === row.taxon.toLowerCase());
  if (!learnt) return [];
  const rate = days(Math.exp(learnt.logMean));
  return [
    `Development of ${learnt.taxon} runs at ${rate} of these durations: ${learnt.source}. Trust: ${learnt.trust}.`,
  ];
}

/** What the dates rest on, in plain words, most important first. */
export function assumptionTexts(input: AssumptionInput): string[] {
  const { choice, settings, unsureCells, clock } = input;
  const { foundingLead, instar5Share, cellsPerDay, priorSpan } = settings.values;
  return [
    durationText(choice),
    ...totalText(choice),
    ...factorTexts(choice, settings),
    'Small larva means instars 1 to 3, medium instar 4, large instar 5, capped everything under the cap.',
    `Instar 5 takes ${percent(instar5Share.value)} of the larval time and the others share the rest equally; nobody has published instar durations.`,
    spreadText(settings),
    `Cells nearer the pedicel are older. Before the first count the comb grew by ${days(cellsPerDay.value)} cell(s) a day, unless three or more counts say otherwise; nothing is searched for more than ${days(priorSpan.value)} days back.`,
    'All looks into a cell count together: also that it was not there yet, was empty or was lost.',
    confusionText(settings),
    clockText(settings, clock),
    lossText(settings),
    `The nest's own dates are the earliest over its cells; founding is ${days(foundingLead.value)} day(s) before the first egg.`,
    ...(unsureCells > 0 ? [`Marked unsure: ${unsureCells} cell(s).`] : []),
  ];
}
