'use client';
import type { SessionView } from '@/lib/offline/session-view';
export interface Session { view: SessionView; signOut(): Promise<void>; refresh(): Promise<void> }
/** Who uses the field app: opens the right person's records, with or without signal. */
export declare function useSession(): Session;
