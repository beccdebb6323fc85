import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { SecondBench } from '@/components/field/second/second-bench';
import { nestLine, purposeWords } from '@/components/lab/lab-words';
import { buttonLook } from '@/components/ui/button-look';
import { momentWords } from '@/components/ui/date-words';
import { Notice } from '@/components/ui/notice';
import { PageTitle } from '@/components/ui/page-title';
import { requirePage } from '@/lib/server/auth/current-session';
import { type SecondDesk, secondDesk } from '@/lib/server/queries/review/second-desk';
import { foundOrAway } from '@/app/(lab)/problem-code';

export const metadata: Metadata = { title: 'Second reading' };

interface ReadPageProps {
  params: Promise<{ id: string }>;
}

/** Why there is no bench for this person: they have read it, somebody else has taken it on, or nobody has. */
function NotTaken({ desk: { reader, done, visit } }: { desk: SecondDesk }): ReactElement {
  if (done) {
    return (
      <Notice title="Your reading is at the office.">
        <p>Both readings can be compared now.</p>
        <a href={`/review/${visit}`} className={buttonLook('main', 'lab', 'mt-3 min-h-11')}>
          Compare both readings
        </a>
      </Notice>
    );
  }
  return (
    <Notice title={reader ? `${reader} has taken on this second reading.` : 'Take this reading on first.'}>
      <p>From the moment you take it on, the first reading is kept from you until yours is handed in.</p>
      <a href="/review" className={buttonLook('plain', 'lab', 'mt-3 min-h-11')}>
        Go to the list
      </a>
    </Notice>
  );
}

/** The bench of a blind second reading: an empty comb, the keyboard, and no word about the first reading. */
export default async function ReadPage({ params }: ReadPageProps): Promise<ReactElement> {
  const session = await requirePage('review.work');
  const { id } = await params;
  const desk = await foundOrAway(secondDesk(session, id));
  const mayRead = desk.reading !== null || (desk.mine && !desk.done);
  const title = nestLine(desk);
  return (
    <>
      <PageTitle under={`${purposeWords(desk.purpose)}, ${momentWords(desk.startedAt, session.zone)}`}>
        Second reading of {title}
      </PageTitle>
      {mayRead ? (
        <SecondBench at={{ nest: desk.nest, visit: desk.visit, title }} reading={desk.reading} />
      ) : (
        <NotTaken desk={desk} />
      )}
    </>
  );
}
