import type { Metadata } from 'next';
import { type ReactElement, Suspense } from 'react';
import { BroodBody } from '@/components/lab/brood/brood-body';
import { VisitStepper } from '@/components/lab/brood/visit-stepper';
import { nestLine } from '@/components/lab/lab-words';
import { NestTitle } from '@/components/lab/nest-title';
import { NoReading } from '@/components/lab/no-reading';
import { BackToNest } from '@/components/lab/brood/back-to-nest';
import { LoadingLines } from '@/components/ui/loading-lines';
import { localDate } from '@/lib/kit/local-date';
import { systemClock } from '@/lib/kit/system-clock';
import { requirePage } from '@/lib/server/auth/current-session';
import { nestDetail } from '@/lib/server/queries/nest-detail';
import { foundOrAway } from '@/app/(lab)/problem-code';
import { broodPageData } from './brood-page-data';
import { LookBack } from './look-back';

interface BroodPageProps {
  params: Promise<{ id: string }>;
  searchParams: Promise<{ visit?: string | string[] }>;
}

/** The browser's title: code and name. */
export async function generateMetadata({ params }: BroodPageProps): Promise<Metadata> {
  const session = await requirePage('brood.read');
  const { id } = await params;
  return { title: `Brood of ${nestLine(await foundOrAway(nestDetail(session, id)))}` };
}

/** The brood of one nest, as known at any of its visits. */
export default async function BroodPage({ params, searchParams }: BroodPageProps): Promise<ReactElement> {
  const session = await requirePage('brood.read');
  const [{ id }, { visit: asked }] = await Promise.all([params, searchParams]);
  const data = await foundOrAway(broodPageData(session, id, typeof asked === 'string' ? asked : undefined));
  const { nest, readings, stops, shown } = data;
  const year = localDate(systemClock.now(), session.zone);
  if (!shown) {
    return (
      <>
        <NestTitle {...nest} />
        <BackToNest nest={nest.id} />
        <NoReading hidden={nest.visits.some((visit) => visit.readings.length > 0)} />
      </>
    );
  }
  const { at, stop, estimate } = shown;
  const known = stops.slice(0, at + 1).filter(({ key }) => key !== 'now');
  return (
    <>
      <NestTitle {...nest} />
      <BackToNest nest={nest.id} />
      <VisitStepper nest={nest.id} stops={stops.map(({ key, label }) => ({ key, label }))} at={at} />
      <BroodBody
        code={nest.code}
        estimate={estimate}
        day={stop.day}
        visits={known.map(({ day }) => day)}
        year={year}
        lookBack={
          <Suspense fallback={<LoadingLines what="Earlier ranges" lines={3} />}>
            <LookBack session={session} nest={nest} readings={readings} stops={stops} estimate={estimate} year={year} />
          </Suspense>
        }
      />
    </>
  );
}
