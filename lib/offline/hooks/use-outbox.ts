'use client';

import { browserClock } from '@/lib/offline/browser-clock-edge';
import { acknowledge } from '@/lib/offline/acknowledge';
import { browserSha256 } from '@/lib/offline/browser-sha256';
import type { LocalOp } from '@/lib/offline/local-op';
import type { OutboxItem, OutboxLists } from '@/lib/offline/read-outbox';
import { readOutbox, readUnbacked, readUnsent } from '@/lib/offline/read-outbox';
import type { Records } from '@/lib/offline/records';
import { writeUnsentFile } from '@/lib/offline/unsent-file';
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
  /** Everything that the office's backup may not have, and the ids in it: the copy to make before deleting it here. */
  exportAll(): Promise<{ file: Blob; opIds: ReadonlySet<string> }>;
}

async function unsentFile(records: Records, rows: readonly LocalOp[]): Promise<Blob> {
  const exportedAt = new Date(browserClock.now()).toISOString();
  const unsent = { person: records.person, exportedAt, rows, notSaved: records.notSaved() };
  return new Blob([await writeUnsentFile(browserSha256, unsent)], { type: 'application/json' });
}

async function wholeFile(records: Records): Promise<{ file: Blob; opIds: ReadonlySet<string> }> {
  const rows = await readUnbacked(records.db);
  return { file: await unsentFile(records, rows), opIds: new Set(rows.map(({ op }) => op.opId)) };
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
    exportUnsent: async () => unsentFile(records, await readUnsent(records.db)),
    exportAll: () => wholeFile(records),
  };
}
