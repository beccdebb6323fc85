import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { PhonesTable, RevokedPhones } from '@/components/lab/people/phones-table';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { PageTitle } from '@/components/ui/page-title';
import { Section } from '@/components/ui/section';
import { localDate } from '@/lib/kit/local-date';
import { systemClock } from '@/lib/kit/system-clock';
import { requirePage } from '@/lib/server/auth/current-session';
import { phones } from '@/lib/server/queries/phones';

export const metadata: Metadata = { title: 'Phones' };

/** Enrolled phones: the team's for the coordinator, one's own for everybody else. */
export default async function PhonesPage(): Promise<ReactElement> {
  const session = await requirePage('devices.read');
  const list = await phones(session);
  const time = { zone: session.zone, today: localDate(systemClock.now(), session.zone) };
  const inUse = list.filter(({ revoked }) => revoked === null);
  const withdrawn = list.filter(({ revoked }) => revoked !== null);
  const isCoordinator = session.role === 'coordinator';
  return (
    <>
      <PageTitle under={isCoordinator ? session.teamName : 'Yours in this team'}>Phones</PageTitle>
      {inUse.length === 0 ? (
        <EmptyState title="No phone yet">
          <p>A phone enrols by itself when somebody opens the phone app on it, with signal, and signs in.</p>
          {!isCoordinator && (
            <LinkButton href="/field" className="mt-4">
              Open the phone app here
            </LinkButton>
          )}
        </EmptyState>
      ) : (
        <PhonesTable phones={inUse} {...time} />
      )}
      {withdrawn.length > 0 && (
        <Section id="withdrawn" title="Withdrawn" className="mt-8 max-w-text">
          <RevokedPhones phones={withdrawn} {...time} />
        </Section>
      )}
    </>
  );
}
