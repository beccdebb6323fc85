'use client';

import { useSyncExternalStore } from 'react';
import type { Activity } from '@/lib/offline/records';
import { useRecords } from './use-standing';

const IDLE: Activity = { progress: null, lastEnd: null, notSaved: 0 };

const nothing = () => () => undefined;

/** What the drain is doing now, and how many presses are not saved. */
export function useActivity(): Activity {
  const records = useRecords();
  return useSyncExternalStore(
    records ? records.activity.subscribe : nothing,
    () => records?.activity.get() ?? IDLE,
    () => IDLE,
  );
}
