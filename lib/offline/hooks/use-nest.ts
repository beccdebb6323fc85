'use client';

import type { NestView } from '@/lib/offline/nest-view';
import { readNest } from '@/lib/offline/read-records';
import { useRead } from './use-read';

/** One nest with visits and readings; undefined while loading, null when it is not on this phone. */
export function useNest(id: string): NestView | null | undefined {
  return useRead((db, me) => readNest(db, me, id), ['nest', id]);
}
