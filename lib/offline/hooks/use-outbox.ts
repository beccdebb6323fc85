'use client';

import { browserClock } from '@/lib/offline/browser-clock-edge';
import { acknowledge } from '@/lib/offline/acknowledge';
import { exportUnsent } from '@/lib/offline/export-unsent';
import type { OutboxItem, OutboxLists } from '@/lib/offline/read-outbox';
import { readOutbox, readUnsent } from '@/lib/offline/read-outbox';
import type { Records } from '@/lib/offline/records';
import { useActivity } from './use-activity';
import { useRead } from './use-read';
import { useRecords } from './use-standing';

export type { OutboxItem };

/** What is not at the office, and what can be done about it. */
export interface Outbox extends OutboxLists {
  /** Presses that this phone could not keep (memory only). */
  unsaved: number;
  /** True while a push is on its way from here. */
  busy: boolean;
  /** Tries now, the daily retries too. */
  sendNow(): void;
  /** Notes that a person has looked at everything in `attention`. */
  acknowledge(): Promise<void>;
  /** Everything that is not at the office, as one JSON file to hand over. */
  exportUnsent(): Promise<Blob>;
}

async function unsentFile(records: Records): Promise<Blob> {
  const rows = await readUnsent(records.db);
  const exportedAt = new Date(browserClock.now()).toISOString();
  const text = exportUnsent({ person: records.person, exportedAt, rows, notSaved: records.notSaved() });
  return new Blob([text], { type: 'application/json' });
}

/** What is not at the office yet. Undefined while loading. */
export function useOutbox(): Outbox | undefined {
  const records = useRecords();
  const { progress, notSaved } = useActivity();
  const lists = useRead(readOutbox, ['outbox']);
  if (!records || !lists) return undefined;
  return {
    ...lists,
    unsaved: notSaved,
    busy: progress !== null,
    sendNow: () => records.wake('manual'),
    acknowledge: () =>
      acknowledge(
        records.store,
        lists.attention.map((item) => item.opId),
      ),
    exportUnsent: () => unsentFile(records),
  };
}
