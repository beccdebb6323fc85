import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { FilterForm } from '@/components/lab/filter-form';
import { addressWith, type ListQuery, readListQuery } from '@/components/lab/list-query';
import { NestsTable } from '@/components/lab/nests-table';
import { countWords } from '@/components/ui/date-words';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { PageTitle } from '@/components/ui/page-title';
import { Pager } from '@/components/ui/pager';
import { localDate } from '@/lib/kit/local-date';
import { systemClock } from '@/lib/kit/system-clock';
import { requirePage } from '@/lib/server/auth/current-session';
import { parseNestListQuery } from '@/lib/server/queries/nest-list-query';
import { nestsList } from '@/lib/server/queries/nests-list';
import { teamTaxa } from '@/lib/server/queries/team-taxa';

export const metadata: Metadata = { title: 'Nests' };

interface NestsPageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

/** Why the list is empty, and the way on. */
function NothingFound({ query }: { query: ListQuery }): ReactElement {
  const isNarrowed = [query.q, query.taxon, query.from, query.to].some((value) => value !== undefined);
  return isNarrowed ? (
    <EmptyState title="No nest fits">
      <p>Look for less of the name, another species or a wider span of dates.</p>
    </EmptyState>
  ) : (
    <EmptyState title="No nests yet">
      <p>A nest appears here once a phone has sent it. Start one in the phone app, under Nests.</p>
      <LinkButton href="/start" className="mt-4">
        First steps
      </LinkButton>
    </EmptyState>
  );
}

/** All nests of the team: searched, narrowed, sorted, in pages. */
export default async function NestsPage({ searchParams }: NestsPageProps): Promise<ReactElement> {
  const session = await requirePage('nests.read');
  const query = readListQuery(await searchParams);
  const { page = 1, ...words } = query;
  const [list, taxa] = await Promise.all([
    nestsList(session, parseNestListQuery({ ...words, page: String(page) })),
    teamTaxa(session),
  ]);
  const year = localDate(systemClock.now(), session.zone);
  return (
    <>
      <PageTitle under={session.teamName}>Nests</PageTitle>
      <FilterForm
        path="/nests"
        query={query}
        taxa={taxa.map((taxon) => taxon.name)}
        first={{ name: 'q', label: 'Code or name', value: query.q }}
        act="Look"
      />
      {list.nests.length === 0 ? (
        <NothingFound query={query} />
      ) : (
        <NestsTable nests={list.nests} query={query} zone={session.zone} year={year} />
      )}
      <Pager
        page={list.page}
        pages={list.pages}
        summary={countWords(list.total, 'nest')}
        hrefOf={(to) => addressWith('/nests', { ...query, page: to })}
      />
    </>
  );
}
