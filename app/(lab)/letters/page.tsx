import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { LetterList } from '@/components/lab/people/letter-list';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { PageTitle } from '@/components/ui/page-title';
import { localDate } from '@/lib/kit/local-date';
import { systemClock } from '@/lib/kit/system-clock';
import { requirePage } from '@/lib/server/auth/current-session';
import { letters } from '@/lib/server/queries/letters';

export const metadata: Metadata = { title: 'Letters' };

/** Which letters were written and whether they went out; in the demo they can be read, because none is sent. */
export default async function LettersPage(): Promise<ReactElement> {
  const session = await requirePage('letters.read');
  const { letters: list, box } = await letters(session);
  const time = { zone: session.zone, today: localDate(systemClock.now(), session.zone) };
  return (
    <>
      <PageTitle under={session.teamName}>Letters</PageTitle>
      {box === 'kept' && (
        <Notice className="mb-5 max-w-text">
          <p>
            This is a demo: letters are kept here instead of being sent, with their links. Elsewhere only their readers
            see them.
          </p>
        </Notice>
      )}
      {list.length === 0 ? (
        <EmptyState title="No letter yet">
          <p>Letters appear here when somebody is invited or asks for a new password.</p>
        </EmptyState>
      ) : (
        <LetterList letters={list} {...time} />
      )}
    </>
  );
}
