'use client';
import type { VisitView } from '@/lib/offline/nest-view';
/** One visit with its readings; undefined while loading, null when it is not on this phone. */
export declare function useVisit(id: string): VisitView | null | undefined;
