import type { ReactElement, ReactNode } from 'react';
import { DateRangeWords } from '@/components/ui/date-range';
import { type Described, DescriptionList } from '@/components/ui/description-list';
import type { BroodEstimate, DateRange, NestEstimate } from '@/lib/brood/answer';
import { AssumptionsList } from './assumptions-list';
import { SEASON_WORDS } from './lab-words';

interface WhenBlockProps {
  estimate: BroodEstimate;
  /** The reader's year; dates of other years say theirs. */
  year: string;
}

function range(value: DateRange | null, otherwise: ReactNode, year: string): ReactNode {
  return value ? <DateRangeWords median={value.median} ends={value.p80} inYear={year} /> : otherwise;
}

/** Why no first emergence is given: it is past, or there is nothing to date. */
function firstAdultOtherwise(estimate: BroodEstimate): string {
  const isPast = estimate.flags.some(({ code }) => code === 'past');
  return isPast ? 'past: adults have come out already' : 'cannot be dated from this comb';
}

/** How much of the brood is expected to be lost, and in which stage most of it. */
function lossWords({ egg, larva, capped }: NestEstimate['expectedLosses']): string {
  const total = egg + larva + capped;
  if (total < 0.5) return 'fewer than one of the brood now in the comb';
  const most = Math.max(egg, larva, capped);
  const stage = [
    { words: 'eggs', lost: egg },
    { words: 'larvae', lost: larva },
    { words: 'capped brood', lost: capped },
  ].find(({ lost }) => lost === most);
  return `about ${Math.round(total)} of the brood now in the comb, most of it as ${stage?.words}`;
}

/** When the nest was founded, when the first adult is due and whether it may still be moved: ranges, never a bare date. */
export function WhenBlock({ estimate, year }: WhenBlockProps): ReactElement {
  const { nest, temperature } = estimate;
  const items: Described[] = [
    { term: 'Nest founded', children: range(nest.founded, 'cannot be dated from this comb', year) },
    { term: 'First adult expected', children: range(nest.firstEmergence, firstAdultOtherwise(estimate), year) },
    { term: 'Season for moving', children: SEASON_WORDS[nest.season] },
    { term: 'Expected losses', children: lossWords(nest.expectedLosses) },
  ];
  return (
    <>
      <DescriptionList items={items} />
      <p className="mt-3 text-quiet">
        Estimate. Each range holds 8 times in 10.
        {temperature.kind === 'none' && ' No temperature record: calendar days.'}
      </p>
      <AssumptionsList estimate={estimate} year={year} />
    </>
  );
}
