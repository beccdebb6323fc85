'use client';
import type { NestView } from '@/lib/offline/nest-view';
/** One nest with visits and readings; undefined while loading, null when it is not on this phone. */
export declare function useNest(id: string): NestView | null | undefined;
