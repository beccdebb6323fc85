'use client';
import type { ReadingView } from '@/lib/offline/nest-view';
/** One reading with live marks, tally and history; undefined while loading, null when it is not on this phone. */
export declare function useReading(id: string): ReadingView | null | undefined;
