import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { ClosedLink } from '@/components/shell/account/closed-link';
import { JoinForm } from '@/components/shell/account/join-form';
import { PlainFrame } from '@/components/shell/plain-frame';
import { ROLE_WORDS } from '@/components/shell/role-words';
import { openInvitation } from '@/lib/server/auth/open-invitation';

export const dynamic = 'force-dynamic';
// The address of this page is a secret: no other page is told where the reader came from.
export const metadata: Metadata = { title: 'Join a team', referrer: 'no-referrer' };

interface InvitationPageProps {
  params: Promise<{ token: string }>;
}

/** Where the link of an invitation leads. Opening it uses nothing up. */
export default async function InvitationPage({ params }: InvitationPageProps): Promise<ReactElement> {
  const { token } = await params;
  const open = await openInvitation(token);
  return (
    <PlainFrame>
      {open ? (
        <>
          <h1 className="text-2xl font-bold [overflow-wrap:anywhere]">Join {open.teamName}</h1>
          <p className="mt-2 mb-5">
            You are asked to join as <strong>{ROLE_WORDS[open.role]}</strong>.
            {open.hasAccount && ' You have an account already; the team is added to it.'}
          </p>
          <JoinForm token={token} email={open.email} teamName={open.teamName} hasAccount={open.hasAccount} />
        </>
      ) : (
        <ClosedLink title="This invitation does not work" way={{ href: '/sign-in', words: 'To the sign-in' }}>
          It was used, was taken back, or its seven days are over. Ask the coordinator who invited you to send it again.
          If you have joined already, just sign in.
        </ClosedLink>
      )}
    </PlainFrame>
  );
}
