'use client';

import type { ReactElement } from 'react';
import { FieldLink } from '@/components/field/parts/field-button';
import { useSession } from '@/lib/offline/hooks/use-session';

/** Where one signs in, with the way back. */
export const SIGN_IN_HREF = '/sign-in?callbackUrl=/field';

interface SignInAgainProps {
  /** One line only, while a comb is being read. */
  brief: boolean;
}

/** Says that the session has ended while the work goes on. */
export function SignInAgain({ brief }: SignInAgainProps): ReactElement | null {
  const { view } = useSession();
  if (view.kind !== 'needs-sign-in') return null;
  return (
    <section
      aria-label="Sign in"
      className={`print-hidden border-b-2 border-warn bg-warn-wash px-gap ${brief ? 'py-1' : 'py-4'}`}
    >
      <p>
        <strong>Sign in again as {view.person.displayName}</strong> to send. Everything is kept on this phone.
      </p>
      {!brief && (
        <FieldLink tone="main" href={SIGN_IN_HREF} className="mt-3">
          Sign in again
        </FieldLink>
      )}
    </section>
  );
}
