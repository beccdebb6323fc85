'use client';

import { type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { requestSignOut } from './sign-out';

/** Ends the session and shows the sign-in page; says so when the office can't be reached. */
export function SignOutButton(): ReactElement {
  const [standing, setStanding] = useState<'ready' | 'going' | 'failed'>('ready');
  const signOut = async (): Promise<void> => {
    setStanding('going');
    if (await requestSignOut(fetch)) window.location.assign('/sign-in');
    else setStanding('failed');
  };
  return (
    <>
      <Button tone="quiet" className="px-1" disabled={standing === 'going'} onClick={() => void signOut()}>
        Sign out
      </Button>
      <span role="status" className="text-sm text-stop empty:hidden">
        {standing === 'failed' && 'Not signed out: the office cannot be reached.'}
      </span>
    </>
  );
}
