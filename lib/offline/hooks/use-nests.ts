'use client';
import type { NestSummary } from '@/lib/offline/nest-view';
/** All nests on this phone, the latest visited first; undefined while loading. */
export declare function useNests(): NestSummary[] | undefined;
