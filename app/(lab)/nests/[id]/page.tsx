import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { BroodBrief } from '@/components/lab/brood/brood-brief';
import { CombColumn } from '@/components/lab/comb-column';
import { FlagsList } from '@/components/lab/flags-list';
import { nestLine } from '@/components/lab/lab-words';
import { NestFacts } from '@/components/lab/nest-facts';
import { NestTitle } from '@/components/lab/nest-title';
import { NoReading } from '@/components/lab/no-reading';
import { TemperatureSection } from '@/components/lab/temperature/temperature-section';
import { PaperLinks } from '@/components/lab/paper-links';
import { WhenBlock } from '@/components/lab/when-block';
import { dateWords } from '@/components/ui/date-words';
import { Section } from '@/components/ui/section';
import { requirePage } from '@/lib/server/auth/current-session';
import { nestDetail } from '@/lib/server/queries/nest-detail';
import { foundOrAway } from '@/app/(lab)/problem-code';
import { nestPageData } from './nest-page-data';

interface NestPageProps {
  params: Promise<{ id: string }>;
  searchParams: Promise<{ reading?: string | string[] }>;
}

/** The browser's title: code and name. */
export async function generateMetadata({ params }: NestPageProps): Promise<Metadata> {
  const session = await requirePage('nests.read');
  const { id } = await params;
  return { title: nestLine(await foundOrAway(nestDetail(session, id))) };
}

/** One nest: its comb, when its brood was laid and comes out, its visits, and what the lab decided. */
export default async function NestPage({ params, searchParams }: NestPageProps): Promise<ReactElement> {
  const session = await requirePage('nests.read');
  const [{ id }, { reading: asked }] = await Promise.all([params, searchParams]);
  const data = await foundOrAway(nestPageData(session, id, typeof asked === 'string' ? asked : undefined));
  const { nest, shown, review, estimate, asOf, outcome, temperature } = data;
  const { zone } = session;
  return (
    <>
      <NestTitle {...nest} />
      <div className="grid gap-x-10 gap-y-8 lg:grid-cols-[28rem_minmax(0,1fr)] print:block">
        <div className="min-w-0 self-start lg:sticky lg:top-4">
          {shown ? (
            <CombColumn
              code={nest.code}
              reading={shown.reading}
              visitAt={shown.visitAt}
              settlements={shown.reading.kind === 'final' ? (review?.settlements ?? []) : []}
              estimates={estimate.cells}
              zone={zone}
              year={asOf}
            />
          ) : (
            <NoReading hidden={nest.visits.some(({ readings }) => readings.length > 0)} />
          )}
          <PaperLinks nest={nest.id} />
        </div>
        <div className="min-w-0 print:mt-6">
          <Section id="when" title="When" aside={`as known on ${dateWords(asOf, data.today)}`}>
            <WhenBlock estimate={estimate} year={asOf} />
            <FlagsList flags={estimate.flags} />
          </Section>
          <Section id="brood" title="Brood" className="mt-8">
            <BroodBrief nest={nest.id} estimate={estimate} />
          </Section>
          <TemperatureSection nest={nest.id} temperature={temperature} role={session.role} inYear={asOf} />
          <NestFacts
            nest={nest}
            shown={shown?.reading.id ?? null}
            review={review}
            outcome={outcome}
            role={session.role}
            zone={zone}
            year={asOf}
          />
        </div>
      </div>
    </>
  );
}
