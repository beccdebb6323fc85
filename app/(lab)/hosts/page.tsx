import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { HostsTable } from '@/components/lab/hosts-table';
import { EmptyState } from '@/components/ui/empty-state';
import { PageTitle } from '@/components/ui/page-title';
import { requirePage } from '@/lib/server/auth/current-session';
import { hosts } from '@/lib/server/queries/hosts';

export const metadata: Metadata = { title: 'Hosts' };

/** The places nests may be moved to. */
export default async function HostsPage(): Promise<ReactElement> {
  const session = await requirePage('hosts.read');
  const { hosts: offered } = await hosts(session);
  return (
    <>
      <PageTitle under="A host may take the offer back at any time.">Hosts</PageTitle>
      {offered.length === 0 ? (
        <EmptyState title="No host yet">
          <p>A place is needed before a visit is planned. Your coordinator enters hosts before the season.</p>
        </EmptyState>
      ) : (
        <HostsTable hosts={offered} rounded={session.role === 'researcher'} />
      )}
    </>
  );
}
