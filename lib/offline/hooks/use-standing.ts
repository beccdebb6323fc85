'use client';

import { useSyncExternalStore } from 'react';
import { browserFieldApp } from '@/lib/offline/browser-field-app';
import type { FieldStanding } from '@/lib/offline/field-session';
import type { Records } from '@/lib/offline/records';

const PRERENDERED: FieldStanding = { view: { kind: 'loading' }, records: null, tab: 'alone' };

function subscribe(listener: () => void): () => void {
  return browserFieldApp().standing.subscribe(listener);
}

/** Who uses the app and their open records. Loading while the page is prerendered. */
export function useStanding(): FieldStanding {
  return useSyncExternalStore(
    subscribe,
    () => browserFieldApp().standing.get(),
    () => PRERENDERED,
  );
}

/** The open records; null while there are none. */
export function useRecords(): Records | null {
  return useStanding().records;
}
