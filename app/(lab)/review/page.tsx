import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { QueueTable } from '@/components/lab/review/queue-table';
import { ReadersTable } from '@/components/lab/review/readers-table';
import { countWords } from '@/components/ui/date-words';
import { EmptyState } from '@/components/ui/empty-state';
import { PageTitle } from '@/components/ui/page-title';
import { Section } from '@/components/ui/section';
import { localDate } from '@/lib/kit/local-date';
import { systemClock } from '@/lib/kit/system-clock';
import { requirePage } from '@/lib/server/auth/current-session';
import { reviewQueue } from '@/lib/server/queries/review/review-queue';

export const metadata: Metadata = { title: 'Review' };

/** What waits in the lab: second readings, settling, locking; and who has what in hand. */
export default async function ReviewPage(): Promise<ReactElement> {
  const session = await requirePage('review.read');
  const now = systemClock.now();
  const { waiting, readers, overdueDays } = await reviewQueue(session, now);
  const overdue = waiting.filter((item) => item.overdue).length;
  return (
    <>
      <PageTitle under={`Overdue after ${countWords(overdueDays, 'day')}: ${overdue}.`}>Review</PageTitle>
      {waiting.length === 0 ? (
        <EmptyState title="Nothing waits">
          <p>A reading comes here when it is handed in from the field, and leaves when it is locked.</p>
        </EmptyState>
      ) : (
        <QueueTable
          rows={waiting}
          zone={session.zone}
          year={localDate(now, session.zone)}
          frees={session.role === 'biologist'}
        />
      )}
      <Section id="people" title="People" className="mt-10">
        <ReadersTable readers={readers} />
      </Section>
    </>
  );
}
