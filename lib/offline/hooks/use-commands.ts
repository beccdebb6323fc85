'use client';

import type { Commands } from '@/lib/offline/commands';
import { useRecords } from './use-standing';

export type { Commands };

/**
 * Opens nests, visits and readings and sets fields. Each resolves when its transaction has completed, and rejects with
 * `NotSavedError` when the phone could not keep it. Null while no records are open.
 */
export function useCommands(): Commands | null {
  return useRecords()?.commands ?? null;
}
