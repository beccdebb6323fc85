import type { ReactElement } from 'react';
import { settles } from '@/components/shell/role-words';
import { Section } from '@/components/ui/section';
import { HistoryList } from './history-list';
import type { NestView, ReviewView } from './lab-shapes';
import { placeWords } from './lab-words';
import { OutcomeBlock, type OutcomeView } from './outcome-block';
import { ReadingList } from './reading-list';

interface NestFactsProps {
  nest: NestView;
  /** The reading the page shows. */
  shown: string | null;
  review: ReviewView | null;
  outcome: OutcomeView | null;
  role: Parameters<typeof settles>[0];
  zone: string;
  year: string;
}

/** What is on record about a nest besides its brood: visits and readings, what the lab settled, the outcome, the place. */
export function NestFacts({ nest, shown, review, outcome, role, zone, year }: NestFactsProps): ReactElement {
  return (
    <>
      <Section id="visits" title="Visits and readings" className="mt-8">
        {nest.visits.length === 0 ? (
          <p className="text-quiet">No visit yet.</p>
        ) : (
          <ReadingList
            nest={nest.id}
            visits={nest.visits}
            shown={shown}
            zone={zone}
            year={year}
            settles={settles(role)}
          />
        )}
      </Section>
      {review && (
        <Section id="decided" title="Settled in the lab" className="mt-8">
          <HistoryList review={review} zone={zone} year={year} />
        </Section>
      )}
      {outcome && (
        <Section id="outcome" title="Outcome" className="mt-8">
          <OutcomeBlock outcome={outcome} />
        </Section>
      )}
      <Section id="place" title="Where it hung" className="mt-8">
        <p>{nest.place ? placeWords(nest.place, role === 'researcher') : 'No place was recorded.'}</p>
      </Section>
    </>
  );
}
