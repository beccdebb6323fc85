'use client';

import { useSyncExternalStore } from 'react';
import { localDate } from '@/lib/kit/local-date';
import { systemClock } from '@/lib/kit/system-clock';

/** Looks at the date again whenever the page comes back into view: a phone sleeps over midnight. */
function onReturn(changed: () => void): () => void {
  document.addEventListener('visibilitychange', changed);
  return () => document.removeEventListener('visibilitychange', changed);
}

/** The local date (`YYYY-MM-DD`) in a zone, kept right when the app is opened again the next day. */
export function useToday(zone: string): string {
  return useSyncExternalStore(
    onReturn,
    () => localDate(systemClock.now(), zone),
    () => '',
  );
}
