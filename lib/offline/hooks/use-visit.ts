'use client';

import type { VisitView } from '@/lib/offline/nest-view';
import { readVisit } from '@/lib/offline/read-records';
import { useRead } from './use-read';

/** One visit with its readings; undefined while loading, null when it is not on this phone. */
export function useVisit(id: string): VisitView | null | undefined {
  return useRead((db, me) => readVisit(db, me, id), ['visit', id]);
}
