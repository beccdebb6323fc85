import type { ReactElement } from 'react';
import { spanWords } from '@/components/ui/date-words';
import { Disclosure } from '@/components/ui/disclosure';
import type { BroodEstimate, DateRange } from '@/lib/brood/answer';

interface AssumptionsListProps {
  estimate: BroodEstimate;
  year: string;
}

function widths(what: string, value: DateRange | null, year: string): string[] {
  if (!value) return [];
  return [
    `${what}: 5 times in 10 between ${spanWords(value.p50, year)}; 95 times in 100 between ${spanWords(value.p95, year)}.`,
  ];
}

/** What the dates rest on: durations and their trust, the model, every assumption, and narrower and wider ranges. */
export function AssumptionsList({ estimate, year }: AssumptionsListProps): ReactElement {
  const { durations, model, settings, assumptions, temperature, nest, zone } = estimate;
  const lines = [
    `Durations of ${durations.taxon}: egg ${durations.egg} d, larva ${durations.larva} d, capped ${durations.capped} d at ${durations.referenceC} °C. Trust: ${durations.trust}. Source: ${durations.source}.`,
    ...assumptions,
    ...(temperature.note ? [temperature.note] : []),
    ...widths('Nest founded', nest.founded, year),
    ...widths('First adult', nest.firstEmergence, year),
    `Development is ${nest.rateMultiplier.median.toFixed(2)} times as fast as these durations (95 times in 100: ${nest.rateMultiplier.p95.map((value) => value.toFixed(2)).join(' to ')}).`,
    `Model ${model.name} ${model.version}, settings version ${settings.version}. Dates are local dates in ${zone}.`,
  ];
  return (
    <Disclosure summary="Assumptions" className="mt-1 print-open">
      <ul className="flex list-disc flex-col gap-1.5 pl-4 text-[0.9375rem]">
        {lines.map((line) => (
          <li key={line} className="[overflow-wrap:anywhere]">
            {line}
          </li>
        ))}
      </ul>
    </Disclosure>
  );
}
