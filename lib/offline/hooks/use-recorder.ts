'use client';
import type { Recorder } from '@/lib/offline/recorder-view';
/** The comb recorder of one reading; undefined while loading, null when the reading is not on this phone. */
export declare function useRecorder(readingId: string): Recorder | null | undefined;
