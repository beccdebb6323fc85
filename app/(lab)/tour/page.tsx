import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { TourList } from '@/components/lab/start/tour-list';
import { TOUR, TOUR_NESTS } from '@/components/lab/start/tour-stops';
import { PageTitle } from '@/components/ui/page-title';
import { requirePage } from '@/lib/server/auth/current-session';
import { nestsByCode } from '@/lib/server/queries/nests-by-code';

export const metadata: Metadata = { title: 'A season, step by step' };

/** A walk through the demo season: every part of the product in the order of the work. */
export default async function TourPage(): Promise<ReactElement> {
  const session = await requirePage('nests.read');
  const nests = await nestsByCode(session, TOUR_NESTS);
  return (
    <>
      <PageTitle under={`${TOUR.length} stops, about ten minutes. The people, places and nests are invented.`}>
        A season, step by step
      </PageTitle>
      <TourList role={session.role} nests={nests} />
    </>
  );
}
