import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import type { ReactElement } from 'react';
import { ConfirmAct } from '@/components/lab/people/confirm-act';
import { OwnSessions } from '@/components/lab/people/own-sessions';
import { OwnTeams } from '@/components/lab/people/own-teams';
import { PasswordForm } from '@/components/lab/people/password-form';
import { ROLE_WORDS } from '@/components/shell/role-words';
import { PageTitle } from '@/components/ui/page-title';
import { Section } from '@/components/ui/section';
import { localDate } from '@/lib/kit/local-date';
import { systemClock } from '@/lib/kit/system-clock';
import { currentSession } from '@/lib/server/auth/current-session';
import { ownAccount } from '@/lib/server/queries/own-account';

export const metadata: Metadata = { title: 'Your account' };

/** One's own account: where one is signed in, the password, the teams, and the way out of this one. */
export default async function AccountPage(): Promise<ReactElement> {
  const session = await currentSession();
  if (!session) redirect('/sign-in');
  const nowMs = systemClock.now();
  const { email, teams, sessions } = await ownAccount(session, nowMs);
  const time = { zone: session.zone, today: localDate(nowMs, session.zone) };
  return (
    <>
      <PageTitle under={`${session.displayName}, ${ROLE_WORDS[session.role]} of ${session.teamName}`}>
        Your account
      </PageTitle>
      <div className="grid gap-x-12 gap-y-10 lg:grid-cols-2">
        <div className="flex min-w-0 flex-col gap-10">
          <Section id="sign-ins" title="Where you are signed in">
            <OwnSessions sessions={sessions} showTeams={teams.length > 1} {...time} />
          </Section>
          {teams.length > 1 && (
            <Section id="teams" title="Your teams">
              <OwnTeams teams={teams} />
            </Section>
          )}
        </div>
        <Section id="password" title="Change the password" className="min-w-0">
          <PasswordForm email={email} />
        </Section>
      </div>
      <Section id="leave" title="Leave the team" className="mt-10 max-w-text">
        <p className="mb-3">What you recorded stays with {session.teamName}, under your name.</p>
        <ConfirmAct
          words={`Leave ${session.teamName}`}
          tone="stop"
          title={`Leave ${session.teamName}?`}
          act="Leave the team"
          path="/api/account/leave"
          then="/sign-in"
        >
          <p>
            Every sign-in of yours to this team ends at once. Send what your phones hold first: afterwards only a new
            invitation lets them send it.
          </p>
        </ConfirmAct>
      </Section>
    </>
  );
}
