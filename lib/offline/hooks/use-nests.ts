'use client';

import type { NestSummary } from '@/lib/offline/nest-view';
import { readNests } from '@/lib/offline/read-records';
import { useRead } from './use-read';

/** All nests on this phone, the latest visited first; undefined while loading. */
export function useNests(): NestSummary[] | undefined {
  return useRead(readNests, ['nests']);
}
