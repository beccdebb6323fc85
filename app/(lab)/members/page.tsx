import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { InvitationsTable } from '@/components/lab/people/invitations-table';
import { InviteForm } from '@/components/lab/people/invite-form';
import { LetterBoxNotice } from '@/components/lab/people/letter-box-notice';
import { FormerMembers, MembersTable } from '@/components/lab/people/members-table';
import { PageTitle } from '@/components/ui/page-title';
import { Section } from '@/components/ui/section';
import { localDate } from '@/lib/kit/local-date';
import { systemClock } from '@/lib/kit/system-clock';
import { requirePage } from '@/lib/server/auth/current-session';
import { teamMembers } from '@/lib/server/queries/members';

export const metadata: Metadata = { title: 'Members' };

/** Everybody of the team, for the coordinator: asked in, changed, let go. */
export default async function MembersPage(): Promise<ReactElement> {
  const session = await requirePage('members.write');
  const nowMs = systemClock.now();
  const { members, former, invitations, box } = await teamMembers(session, nowMs);
  const time = { zone: session.zone, today: localDate(nowMs, session.zone) };
  return (
    <>
      <PageTitle under={session.teamName}>Members</PageTitle>
      <LetterBoxNotice box={box} />
      <Section id="invite" title="Invite somebody">
        <InviteForm />
      </Section>
      {invitations.length > 0 && (
        <Section id="invited" title="Invited, not answered yet" className="mt-8">
          <InvitationsTable invitations={invitations} {...time} />
        </Section>
      )}
      <Section id="members" title="In the team" aside={`${members.length}`} className="mt-8">
        <MembersTable members={members} {...time} />
      </Section>
      {former.length > 0 && (
        <Section id="former" title="Were in the team" className="mt-8 max-w-text">
          <FormerMembers members={former} {...time} />
        </Section>
      )}
    </>
  );
}
