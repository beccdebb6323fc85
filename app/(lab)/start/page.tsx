import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { firstStepsOf } from '@/components/lab/start/first-steps';
import { FirstStepsList } from '@/components/lab/start/first-steps-list';
import { OtherWays } from '@/components/lab/start/other-ways';
import { PageTitle } from '@/components/ui/page-title';
import { requirePage } from '@/lib/server/auth/current-session';
import { firstSteps } from '@/lib/server/queries/first-steps';

export const metadata: Metadata = { title: 'First steps' };

/** From an empty team to a first nest with dates: what is done, what is next, who does it. */
export default async function StartPage(): Promise<ReactElement> {
  const session = await requirePage('nests.read');
  const steps = firstStepsOf(await firstSteps(session), session.role);
  const isThrough = steps.every(({ state }) => state === 'done');
  return (
    <>
      <PageTitle
        under={isThrough ? 'Your team has been through all five.' : 'From an empty team to a nest with dates.'}
      >
        First steps
      </PageTitle>
      <FirstStepsList steps={steps} />
      <OtherWays />
    </>
  );
}
