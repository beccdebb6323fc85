import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import type { ReactElement } from 'react';
import { PlainFrame } from '@/components/shell/plain-frame';
import { SignInForm } from '@/components/shell/sign-in-form';
import { pathAfterSignIn } from '@/components/shell/sign-in-request';
import { Notice } from '@/components/ui/notice';
import { currentSession } from '@/lib/server/auth/current-session';
import { demoSignIns } from '@/lib/server/auth/demo-sign-ins';

export const dynamic = 'force-dynamic';
export const metadata: Metadata = { title: 'Sign in' };

interface SignInPageProps {
  searchParams: Promise<{ next?: string | string[] }>;
}

/** E-mail and password; whoever is signed in already goes straight on. */
export default async function SignInPage({ searchParams }: SignInPageProps): Promise<ReactElement> {
  const { next: asked } = await searchParams;
  const next = pathAfterSignIn(typeof asked === 'string' ? asked : undefined);
  if (await currentSession()) redirect(next);
  return (
    <PlainFrame>
      <h1 className="mb-5 text-2xl font-bold">Sign in</h1>
      <noscript>
        <Notice tone="warn" className="mb-4">
          <p>Signing in needs scripts. Switch them on for this site, then load the page again.</p>
        </Notice>
      </noscript>
      <SignInForm next={next} demo={await demoSignIns()} />
    </PlainFrame>
  );
}
