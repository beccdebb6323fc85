import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { ClosedLink } from '@/components/shell/account/closed-link';
import { ResetForm } from '@/components/shell/account/reset-form';
import { PlainFrame } from '@/components/shell/plain-frame';
import { openReset } from '@/lib/server/auth/open-reset';

export const dynamic = 'force-dynamic';
// The address of this page is a secret: no other page is told where the reader came from.
export const metadata: Metadata = { title: 'New password', referrer: 'no-referrer' };

interface ResetPageProps {
  params: Promise<{ token: string }>;
}

/** Where the link of a letter about a forgotten password leads. Opening it uses nothing up. */
export default async function ResetPage({ params }: ResetPageProps): Promise<ReactElement> {
  const { token } = await params;
  const isOpen = (await openReset(token)) !== null;
  return (
    <PlainFrame>
      {isOpen ? (
        <>
          <h1 className="mb-5 text-2xl font-bold">Choose a new password</h1>
          <ResetForm token={token} />
        </>
      ) : (
        <ClosedLink title="This link does not work" way={{ href: '/reset', words: 'Ask for a new link' }}>
          It was used, its hour is over, or a newer letter has replaced it.
        </ClosedLink>
      )}
    </PlainFrame>
  );
}
