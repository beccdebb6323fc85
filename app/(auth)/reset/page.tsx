import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { ForgottenForm } from '@/components/shell/account/forgotten-form';
import { PlainFrame } from '@/components/shell/plain-frame';

export const dynamic = 'force-dynamic';
export const metadata: Metadata = { title: 'Forgotten password' };

/** Asks for a link to a new password. */
export default function ForgottenPage(): ReactElement {
  return (
    <PlainFrame>
      <h1 className="text-2xl font-bold">Forgotten your password?</h1>
      <p className="mt-2 mb-5">Give the address you sign in with. A letter with a link comes to it.</p>
      <ForgottenForm />
      <p className="mt-6">
        <a href="/sign-in" className="inline-flex min-h-9 items-center text-main underline underline-offset-4">
          Back to the sign-in
        </a>
      </p>
    </PlainFrame>
  );
}
