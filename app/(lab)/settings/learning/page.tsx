import type { Metadata } from 'next';
import Link from 'next/link';
import type { ReactElement } from 'react';
import { LearnedConfusion } from '@/components/lab/settings/learned-confusion';
import { confusionChange, factorChange } from '@/components/lab/settings/learned-draft';
import { LearnedDurations } from '@/components/lab/settings/learned-durations';
import { LearningAct } from '@/components/lab/settings/learning-acts';
import { ownsSettings } from '@/components/shell/role-words';
import { countWords } from '@/components/ui/date-words';
import { PageTitle } from '@/components/ui/page-title';
import { Section } from '@/components/ui/section';
import { systemClock } from '@/lib/kit/system-clock';
import { requirePage } from '@/lib/server/auth/current-session';
import { learning } from '@/lib/server/queries/settings/learning';

export const metadata: Metadata = { title: 'What your own readings say' };

/** What the team's own readings say about readers and durations; nothing of it counts before it is signed. */
export default async function LearningPage(): Promise<ReactElement> {
  const session = await requirePage('settings.read');
  const learnt = await learning(session, systemClock.now());
  const { cells, pseudoCount, confusion, durations } = learnt;
  const isOwner = ownsSettings(session.role);
  return (
    <>
      <PageTitle
        under={
          <Link href="/settings" className="text-main underline underline-offset-4">
            Settings in force
          </Link>
        }
      >
        What your own readings say
      </PageTitle>
      <p className="max-w-text">
        Nothing here changes a date. The lead biologist may put it into a draft, see what would move, and sign it.
      </p>
      <Section id="learnt-confusion" title="How readers err" aside={countWords(cells, 'cell')} className="mt-8">
        <p className="mb-3 max-w-text text-quiet">
          From visits that two people read and the lab locked: what each had recorded, against what was settled. The
          product’s own row counts as {pseudoCount} cells. An error both readers made is not seen.
        </p>
        {confusion.length === 0 ? (
          <p>No locked double reading yet.</p>
        ) : (
          <>
            <LearnedConfusion confusion={confusion} />
            {isOwner && <LearningAct label="Put these rows into the draft" change={confusionChange(learnt)} />}
          </>
        )}
      </Section>
      <Section id="learnt-durations" title="How long the stages last" className="mt-8">
        <p className="mb-3 max-w-text text-quiet">
          From broods of which a whole stage began and ended between two visits not too far apart. A factor above 1 says
          that your nests take longer than the durations say.
        </p>
        {durations.length === 0 ? (
          <p>No brood was followed through a whole stage yet.</p>
        ) : (
          <>
            <LearnedDurations durations={durations} />
            {isOwner && <LearningAct label="Put these factors into the draft" change={factorChange(learnt)} />}
          </>
        )}
      </Section>
    </>
  );
}
