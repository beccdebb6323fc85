'use client';
export interface OutboxItem { opId: string; words: string; nest: string | null; savedAt: number; why: 'waiting' | 'refused' | 'suspect' | 'set-aside'; code: string | null }
export interface Outbox {
  waiting: number;
  /** The first 200 operations still to be sent, in order. */
  queue: OutboxItem[];
  /** Refused, suspect and set-aside operations: they need a person. */
  attention: OutboxItem[];
  /** Presses that this phone could not keep (memory only). */
  unsaved: number;
  /** True while a push or pull is running here. */
  busy: boolean;
  /** Tries now, the daily retries too. */
  sendNow(): void;
  /** Everything that is not at the office, as one JSON file to hand over. */
  exportUnsent(): Promise<Blob>;
}
/** What is not at the office yet. Undefined while loading. */
export declare function useOutbox(): Outbox | undefined;
