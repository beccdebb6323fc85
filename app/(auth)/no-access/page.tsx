import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import type { ReactElement } from 'react';
import { PlainFrame } from '@/components/shell/plain-frame';
import { ROLE_WORDS } from '@/components/shell/role-words';
import { SignOutButton } from '@/components/shell/sign-out-button';
import { LinkButton } from '@/components/ui/link-button';
import { currentSession } from '@/lib/server/auth/current-session';

export const dynamic = 'force-dynamic';
export const metadata: Metadata = { title: 'Not for your role' };

/** Where people land who asked for a page their role may not open. */
export default async function NoAccessPage(): Promise<ReactElement> {
  const session = await currentSession();
  if (!session) redirect('/sign-in');
  return (
    <PlainFrame>
      <h1 className="text-2xl font-bold">This page is not for your role</h1>
      <p className="mt-3">
        You are signed in as {session.displayName}, {ROLE_WORDS[session.role]} of {session.teamName}. If you need this
        page, ask your coordinator.
      </p>
      <div className="mt-6 flex flex-wrap items-center gap-3">
        <LinkButton href="/nests" tone="main">
          To the nests
        </LinkButton>
        {session.role !== 'researcher' && <LinkButton href="/field">Phone app</LinkButton>}
        <SignOutButton />
      </div>
    </PlainFrame>
  );
}
