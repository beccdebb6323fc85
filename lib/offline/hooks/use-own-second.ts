'use client';

import { readOwnSecond } from '@/lib/offline/own-second';
import { useRead } from './use-read';

/** The second reading this person began at a visit; undefined while loading, null when there is none here. */
export function useOwnSecond(visit: string): string | null | undefined {
  return useRead((db, me) => readOwnSecond(db, me, visit), ['own-second', visit]);
}
