'use client';

import { browserFieldApp } from '@/lib/offline/browser-field-app';
import type { SessionView } from '@/lib/offline/session-view';
import { useStanding } from './use-standing';

/** Who uses the field app, and what they can do about it. */
export interface Session {
  view: SessionView;
  /** Leaves this phone; unsent records stay on it, closed. Works without signal. */
  signOut(): Promise<void>;
  /** Leaves this phone and deletes what a copy was made of; false when something came after the copy. */
  signOutAndDelete(copied: ReadonlySet<string>): Promise<boolean>;
  /** Asks the office again who is signed in. */
  refresh(): Promise<void>;
}

const signOut = () => browserFieldApp().signOut();
const signOutAndDelete = (copied: ReadonlySet<string>) => browserFieldApp().signOutAndDelete(copied);
const refresh = () => browserFieldApp().refresh();

/** Who uses the field app: opens the right person's records, with or without signal. */
export function useSession(): Session {
  const { view } = useStanding();
  return { view, signOut, signOutAndDelete, refresh };
}
