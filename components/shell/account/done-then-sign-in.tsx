'use client';

import { type ReactElement, useEffect, useRef } from 'react';
import { LinkButton } from '@/components/ui/link-button';

/** What was done, and the way to the sign-in. The keyboard is taken there, as the form it was in is gone. */
export function DoneThenSignIn({ title, email }: { title: string; email: string }): ReactElement {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => heading.current?.focus(), []);
  return (
    <div>
      <h2 ref={heading} tabIndex={-1} className="text-lg font-bold outline-none">
        {title}
      </h2>
      <p className="mt-2 [overflow-wrap:anywhere]">
        Sign in with <strong>{email}</strong> and your password.
      </p>
      <LinkButton href="/sign-in" tone="main" className="mt-5 min-h-12">
        To the sign-in
      </LinkButton>
    </div>
  );
}
