import { localParts } from '@/lib/kit/local-date';
import type { DrainEnd, Progress } from './drain-ports';
import type { OpCounts } from './store';
import type { Trouble } from './trouble';

/** What a person has to do before everything can reach the office. */
export type Need =
  | { what: 'sign-in' }
  /** This phone was withdrawn. */
  | { what: 'revoked' }
  /** The person's role may not send. */
  | { what: 'role' }
  /** The app is too old for the office. */
  | { what: 'update' }
  /** The browser has emptied the phone's storage while the app was open. */
  | { what: 'cleared' }
  /** The office does not take these from this person. */
  | { what: 'refused'; count: number }
  /** The office fails over these. */
  | { what: 'suspect'; count: number }
  /** The office keeps these, set aside for a person to look at. */
  | { what: 'set-aside'; count: number }
  /** The phone could not keep these. */
  | { what: 'not-saved'; count: number };

/** The sync state in the corner, true at every moment. */
export type SyncStatus =
  /** Nothing waits and this phone has not heard from the office yet. */
  | { kind: 'saved-here' }
  | { kind: 'waiting'; waiting: number; trouble: Trouble }
  /** The request on its way ends with operation k of n. */
  | { kind: 'sending'; k: number; n: number }
  /** Nothing waits; `at` is epoch milliseconds of the moment the office last confirmed that. */
  | { kind: 'at-office'; at: number; trouble: Trouble }
  | { kind: 'needs-you'; needs: Need[]; waiting: number };

/** What the status is made from. */
export interface SyncFacts {
  counts: OpCounts;
  /** Presses in memory that the phone could not keep. */
  notSaved: number;
  lastSync: number | null;
  progress: Progress | null;
  /** How the last pass ended; null before the first. */
  lastEnd: DrainEnd | null;
}

const BLOCKING = ['sign-in', 'revoked', 'role', 'update', 'cleared'] as const;

function needsOf({ counts, notSaved, lastEnd }: SyncFacts): Need[] {
  const needs: Need[] = [];
  const blocked = BLOCKING.find((what) => what === lastEnd?.kind);
  if (notSaved > 0) needs.push({ what: 'not-saved', count: notSaved });
  if (blocked) needs.push({ what: blocked });
  if (counts.refused > 0) needs.push({ what: 'refused', count: counts.refused });
  if (counts.suspect > 0) needs.push({ what: 'suspect', count: counts.suspect });
  if (counts.setAside > 0) needs.push({ what: 'set-aside', count: counts.setAside });
  return needs;
}

/** The status that these facts add up to. What a person must do comes first; what waits is never left out. */
export function syncStatus(facts: SyncFacts): SyncStatus {
  const { counts, progress, lastEnd, lastSync } = facts;
  const needs = needsOf(facts);
  const trouble = lastEnd?.kind === 'again' ? lastEnd.trouble : null;
  if (needs.length > 0) return { kind: 'needs-you', needs, waiting: counts.queued };
  if (progress) return { kind: 'sending', ...progress };
  if (counts.queued > 0) return { kind: 'waiting', waiting: counts.queued, trouble };
  return lastSync === null ? { kind: 'saved-here' } : { kind: 'at-office', at: lastSync, trouble };
}

/**
 * The words in the corner.
 *
 * @param zone IANA zone of the time shown.
 */
export function statusWords(status: SyncStatus, zone: string): string {
  switch (status.kind) {
    case 'saved-here':
      return 'saved here';
    case 'waiting':
      return `waiting to send (${status.waiting})`;
    case 'sending':
      return `sending ${status.k} of ${status.n}`;
    case 'at-office':
      return `at the office ${localParts(status.at, zone).time}`;
    case 'needs-you':
      return 'needs you';
  }
}

/** The number on the badge: what waits and what needs a person; 0 shows none. */
export function statusCount(status: SyncStatus): number {
  switch (status.kind) {
    case 'waiting':
      return status.waiting;
    case 'sending':
      return status.n - status.k + 1;
    case 'needs-you':
      return status.waiting + status.needs.reduce((sum, need) => sum + ('count' in need ? need.count : 0), 0);
    default:
      return 0;
  }
}
