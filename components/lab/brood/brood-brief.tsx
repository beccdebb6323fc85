import Link from 'next/link';
import type { ReactElement } from 'react';
import { busyDays, emergenceWords } from '@/components/charts/emergence-days';
import { countWords } from '@/components/ui/date-words';
import type { BroodEstimate } from '@/lib/brood/answer';

interface BroodBriefProps {
  nest: string;
  estimate: BroodEstimate;
}

/** The brood of a nest in two sentences, and the way to all of it. */
export function BroodBrief({ nest, estimate }: BroodBriefProps): ReactElement {
  const dated = estimate.cells.filter(({ laid }) => laid !== null).length;
  const days = busyDays(estimate.nest.emergencePerDay);
  return (
    <>
      <p>
        {dated === 0
          ? 'No cell of this comb holds brood that can be dated.'
          : `${countWords(dated, 'cell')} of ${estimate.cells.length} ${dated === 1 ? 'holds' : 'hold'} brood that can be dated.`}{' '}
        {days.length > 0 && emergenceWords(days)}
      </p>
      <p className="print-hidden mt-2">
        <Link
          href={`/nests/${nest}/brood`}
          className="inline-flex min-h-6 items-center font-bold text-main underline underline-offset-4"
        >
          Brood cell by cell, day by day and visit by visit
        </Link>
      </p>
    </>
  );
}
