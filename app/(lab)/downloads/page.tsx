import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { filterWords } from '@/components/lab/download-files';
import { DownloadsTable } from '@/components/lab/downloads-table';
import { FilterForm } from '@/components/lab/filter-form';
import { readListQuery } from '@/components/lab/list-query';
import { Notice } from '@/components/ui/notice';
import { PageTitle } from '@/components/ui/page-title';
import { Section } from '@/components/ui/section';
import { requirePage } from '@/lib/server/auth/current-session';
import { teamTaxa } from '@/lib/server/queries/team-taxa';

export const metadata: Metadata = { title: 'Downloads' };

interface DownloadsPageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

/** The data as files: narrowed by nest, species and dates, exact or guarded for a spreadsheet. */
export default async function DownloadsPage({ searchParams }: DownloadsPageProps): Promise<ReactElement> {
  const session = await requirePage('export.read');
  const params = await searchParams;
  const query = readListQuery(params);
  const nest = typeof params.nest === 'string' ? params.nest.trim().slice(0, 200) || undefined : undefined;
  const filter = { nest, taxon: query.taxon, from: query.from, to: query.to };
  const taxa = await teamTaxa(session);
  return (
    <>
      <PageTitle under={session.teamName}>Downloads</PageTitle>
      {session.role === 'researcher' && (
        <Notice className="mb-5">
          <p>Places are rounded to a grid square of about 1 km for you.</p>
        </Notice>
      )}
      <FilterForm
        path="/downloads"
        query={query}
        taxa={taxa.map((taxon) => taxon.name)}
        first={{ name: 'nest', label: 'Nest (its code)', value: nest }}
        act="Narrow the files"
      />
      <p className="mb-2" role="status">
        The files hold <strong>{filterWords(filter)}</strong>.
      </p>
      <DownloadsTable filter={filter} />
      <Section id="forms" title="Which form" className="mt-10 max-w-text">
        <p>
          <strong>Exact</strong> is the data as it is, for statistics programs and archives: UTF-8, one header row,
          decimal points, a blank where nothing was recorded.
        </p>
        <p className="mt-2">
          <strong>For a spreadsheet</strong> opens by a double click. Free text that a spreadsheet would run as a
          formula gets a <span className="font-mono">’</span> in front, so these texts differ from what was written. Do
          not feed this form back into a database.
        </p>
      </Section>
    </>
  );
}
