import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { DrawKeys } from '@/components/lab/agreement/draw-keys';
import { LearningList } from '@/components/lab/agreement/learning-list';
import { ReaderTrends } from '@/components/lab/agreement/reader-trends';
import { RereadingsTable } from '@/components/lab/agreement/rereadings-table';
import { StateTrends } from '@/components/lab/agreement/state-trends';
import { YearLinks } from '@/components/lab/agreement/year-links';
import { settles } from '@/components/shell/role-words';
import { EmptyState } from '@/components/ui/empty-state';
import { PageTitle } from '@/components/ui/page-title';
import { Section } from '@/components/ui/section';
import { systemClock } from '@/lib/kit/system-clock';
import { requirePage } from '@/lib/server/auth/current-session';
import { agreementReport } from '@/lib/server/queries/agreement-report';
import { type Rereadings, rereadings } from '@/lib/server/queries/rereadings';

export const metadata: Metadata = { title: 'Agreement' };

interface AgreementPageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

function RereadingsSection({ drawn, undrawnMonths }: Rereadings): ReactElement {
  const waiting = drawn.filter(({ standing }) => standing !== 'done').length;
  return (
    <Section id="again" title="To be read again" aside={`${waiting} not done yet`} className="mb-10">
      <DrawKeys months={undrawnMonths} />
      {drawn.length === 0 ? <p className="text-quiet">Nothing was drawn yet.</p> : <RereadingsTable drawn={drawn} />}
    </Section>
  );
}

/** How far readers agree over a season, what is to be read again, and what can be learnt from it. */
export default async function AgreementPage({ searchParams }: AgreementPageProps): Promise<ReactElement> {
  const session = await requirePage('agreement.read');
  const { year } = await searchParams;
  const nowMs = systemClock.now();
  const report = await agreementReport(session, typeof year === 'string' ? year : undefined, nowMs);
  const seesAll = settles(session.role);
  const ownNotes = report.notes.some(({ own }) => own);
  return (
    <>
      <PageTitle under={`${session.teamName}, season ${report.year}`}>Agreement</PageTitle>
      <YearLinks years={report.years} shown={report.year} />
      {report.notes.length > 0 && (
        <Section id="learn" title={ownNotes ? 'What to look for' : 'Notes for the technicians'} className="mb-10">
          <LearningList people={report.notes} />
        </Section>
      )}
      {report.readers.length === 0 ? (
        <EmptyState title="Nothing to compare yet">
          <p>Figures appear when a comb was read at the nest and again in the lab, and both readings are handed in.</p>
        </EmptyState>
      ) : (
        <>
          <Section id="readers" title={seesAll ? 'By reader' : 'Your readings'} className="mb-10">
            <p className="mb-4 max-w-text text-quiet">
              The share of cells with the same state in both readings, with its 95 % interval after Wilson. Cells of one
              comb are not quite independent, so read the interval as its narrowest.
            </p>
            <ReaderTrends readers={report.readers} />
          </Section>
          <Section id="states" title="By state" className="mb-10">
            <p className="mb-4 max-w-text text-quiet">
              Of the cells that field or lab called so, the share that both called so.
            </p>
            <StateTrends states={report.states} />
          </Section>
        </>
      )}
      {seesAll && <RereadingsSection {...await rereadings(session, nowMs)} />}
    </>
  );
}
