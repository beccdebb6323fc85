'use client';

import type { ReadingView } from '@/lib/offline/nest-view';
import { readReading } from '@/lib/offline/read-records';
import { useRead } from './use-read';

/** One reading with live marks, tally and history; undefined while loading, null when it is not on this phone. */
export function useReading(id: string): ReadingView | null | undefined {
  return useRead((db, me) => readReading(db, me, id), ['reading', id]);
}
