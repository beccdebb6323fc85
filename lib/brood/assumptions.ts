import type { DurationChoice } from './durations';
import type { BroodSettings } from './settings';

/** What the texts depend on. */
interface AssumptionInput {
  choice: DurationChoice;
  settings: BroodSettings;
  /** Cells of the present view that were marked unsure. */
  unsureCells: number;
  /** More than one reading was looked at. */
  hasHistory: boolean;
  /** The founding date is a latest possible one. */
  isFoundingBound: boolean;
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
    'They set the probability that an adult comes out, not the dates.'
  );
}

/** What the dates rest on, in plain words, most important first. */
export function assumptionTexts(input: AssumptionInput): string[] {
  const { choice, settings, unsureCells, hasHistory, isFoundingBound } = input;
  const { foundingLead, instar5Share } = settings.values;
  return [
    durationText(choice),
    ...totalText(choice),
    'Small larva means instars 1 to 3, medium instar 4, large instar 5, capped everything under the cap.',
    `Instar 5 takes ${percent(instar5Share.value)} of the larval time and the others share the rest equally; nobody has published instar durations.`,
    spreadText(settings),
    'Each cell is dated from the last reading that looked into it, as if its egg could have been laid on any day before.',
    ...(hasHistory ? ['Earlier readings are used for flags, for reused cells and for the founding date only.'] : []),
    'No temperature record is used: days are calendar days.',
    lossText(settings),
    `The nest's own dates are those of its most advanced brood; founding is ${days(foundingLead.value)} day(s) before the first egg.`,
    ...(isFoundingBound
      ? ['The oldest cell was already opened, so she founded the nest on the dates shown or earlier.']
      : []),
    ...(unsureCells > 0 ? [`Marked unsure: ${unsureCells} cell(s). They are dated as written.`] : []),
  ];
}
