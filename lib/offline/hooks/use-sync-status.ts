'use client';

import { countOps, readMeta } from '@/lib/offline/dexie-store';
import { type SyncStatus, statusCount, statusWords, syncStatus } from '@/lib/offline/sync-status';
import { useActivity } from './use-activity';
import { useRead } from './use-read';
import { useStanding } from './use-standing';

/** The corner of every field screen. */
export interface Corner {
  status: SyncStatus;
  /** `waiting to send (7)`, `at the office 14:02`, … */
  words: string;
  /** The number on the badge; 0 shows none. */
  count: number;
}

const NOTHING = { queued: 0, suspect: 0, refused: 0, setAside: 0 };

/** The state of everything this phone has recorded, true at every moment. */
export function useSyncStatus(): Corner {
  const { view } = useStanding();
  const activity = useActivity();
  const counts = useRead(countOps, ['counts']) ?? NOTHING;
  const meta = useRead(readMeta, ['meta']);
  const lastEnd = view.kind === 'needs-sign-in' ? ({ kind: 'sign-in' } as const) : activity.lastEnd;
  const status = syncStatus({ ...activity, counts, lastEnd, lastSync: meta?.lastSync ?? null });
  const zone = Intl.DateTimeFormat().resolvedOptions().timeZone;
  return { status, words: statusWords(status, zone), count: statusCount(status) };
}
