import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import type { ReactElement } from 'react';
import { nestLine, purposeWords } from '@/components/lab/lab-words';
import { CompareCombs } from '@/components/lab/review/compare-combs';
import { ConfusionSection } from '@/components/lab/review/confusion-section';
import { DatesDifference } from '@/components/lab/review/dates-difference';
import { FieldReadings } from '@/components/lab/review/field-readings';
import { FiguresTable } from '@/components/lab/review/figures-table';
import { LockSection } from '@/components/lab/review/lock-section';
import { LocksList } from '@/components/lab/review/locks-list';
import { PrintKey } from '@/components/lab/review/print-key';
import { ReviewStanding } from '@/components/lab/review/review-standing';
import { SettleList } from '@/components/lab/review/settle-list';
import { SignLines } from '@/components/lab/review/sign-lines';
import { TallyDifference } from '@/components/lab/review/tally-difference';
import { momentWords } from '@/components/ui/date-words';
import { PageTitle } from '@/components/ui/page-title';
import { Section } from '@/components/ui/section';
import { localDate } from '@/lib/kit/local-date';
import { systemClock } from '@/lib/kit/system-clock';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { requirePage } from '@/lib/server/auth/current-session';
import { type VisitReview, visitReview } from '@/lib/server/queries/review/visit-review';
import { foundOrAway, problemCode } from '@/app/(lab)/problem-code';

export const metadata: Metadata = { title: 'Two readings' };

interface ReviewPageProps {
  params: Promise<{ id: string }>;
}

/** The review of a visit; who still has to read it is sent to their own bench. */
async function seenReview(session: TeamContext, id: string): Promise<VisitReview> {
  try {
    return await foundOrAway(visitReview(session, id));
  } catch (thrown) {
    if (problemCode(thrown) === 'blind') redirect(`/review/${id}/read`);
    throw thrown;
  }
}

function isLocked({ final }: VisitReview): boolean {
  return final !== null && final.version === final.lockedVersion;
}

/** May this role decide something here now? */
function mayDecide(review: VisitReview, role: TeamContext['role']): boolean {
  return !isLocked(review) && (review.comparison?.settler !== 'lead' || role === 'biologist');
}

/** Instants in words: the team's zone, and the year that need not be said. */
interface When {
  zone: string;
  year: string;
}

interface PartProps {
  review: VisitReview;
  when: When;
}

/** Who may decide something here now. */
interface DecideProps extends PartProps {
  decides: boolean;
}

function Settling({ review, when, decides }: DecideProps): ReactElement | null {
  const { comparison, primary, final } = review;
  if (!comparison || !primary) return null;
  return (
    <Section id="settle" title="Settle" aside={`${comparison.open} open`} className="mt-10">
      <SettleList
        reading={primary}
        pairs={comparison.pairs.filter((pair) => pair.open || pair.settled)}
        apart={comparison.dates.byCell}
        settles={decides}
        seen={final?.decisions ?? 0}
        {...when}
      />
    </Section>
  );
}

function Locking({ review, when, decides }: DecideProps): ReactElement | null {
  const { comparison, primary, final } = review;
  if (!primary || (!comparison && !final)) return null;
  return (
    <Section id="lock" title="Final reading" className="mt-10">
      {(decides || isLocked(review)) && (
        <div className="print-hidden mb-4">
          <LockSection
            reading={primary}
            final={final}
            alike={comparison?.agreement.alike ?? null}
            open={comparison?.open ?? 0}
          />
        </div>
      )}
      {final && <LocksList locks={final.locks} amendments={final.amendments} {...when} />}
      {comparison && <SignLines />}
    </Section>
  );
}

/** The figures behind the comparison. */
function Figures({ compared, year }: { compared: NonNullable<VisitReview['comparison']>; year: string }): ReactElement {
  return (
    <>
      <Section id="agreement" title="Agreement" className="mt-10">
        <FiguresTable compared={compared} />
      </Section>
      <div className="grid gap-x-10 lg:grid-cols-2">
        <Section id="confusion" title="What one calls what" className="mt-10 min-w-0">
          <ConfusionSection compared={compared} />
        </Section>
        <Section id="tallies" title="Tallies" className="mt-10 min-w-0">
          <TallyDifference compared={compared} />
        </Section>
      </div>
      <Section id="dates" title="In time" className="mt-10">
        <DatesDifference compared={compared} year={year} />
      </Section>
    </>
  );
}

/** What the page says under its title: which visit, and who read it. */
function underTitle({ visit, fields, primary, second }: VisitReview, { zone, year }: When): string {
  const field = fields.find(({ id }) => id === primary);
  const readers = [field?.observer, second?.observer].filter(Boolean).join(' and ');
  const seen = `${purposeWords(visit.purpose)}, ${momentWords(visit.startedAt, zone, year)}`;
  return readers ? `${seen}, read by ${readers}` : seen;
}

/** Two readings of one comb: beside each other, compared, settled cell by cell, and locked. Prints as a sheet. */
export default async function VisitReviewPage({ params }: ReviewPageProps): Promise<ReactElement> {
  const session = await requirePage('review.read');
  const { id } = await params;
  const review = await seenReview(session, id);
  const { nest, visit, final, comparison, settings, primary } = review;
  const when = { zone: session.zone, year: localDate(systemClock.now(), session.zone) };
  const decides = mayDecide(review, session.role);
  return (
    <>
      <PageTitle under={underTitle(review, when)} act={comparison && <PrintKey />}>
        {nestLine(nest)}: readings
      </PageTitle>
      <ReviewStanding
        compared={comparison}
        final={final}
        threshold={settings.values.reviewAgreement}
        settingsVersion={settings.version}
        leads={session.role === 'biologist'}
      />
      {comparison && <CompareCombs code={nest.code} compared={comparison} />}
      <Settling review={review} when={when} decides={decides} />
      <Locking review={review} when={when} decides={decides} />
      {comparison && <Figures compared={comparison} year={when.year} />}
      <Section id="field-readings" title="Field readings" className="mt-10">
        <FieldReadings
          visit={visit.id}
          nest={nest.id}
          readings={review.fields}
          primary={primary}
          choice={review.choice}
          chooses={!isLocked(review)}
          {...when}
        />
      </Section>
    </>
  );
}
