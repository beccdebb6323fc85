'use client';
import type { SyncStatus } from '@/lib/offline/sync-status';
/** The corner: the status, its words (`at the office 14:02`) and the number for the badge (0 shows none). */
export declare function useSyncStatus(): { status: SyncStatus; words: string; count: number };
