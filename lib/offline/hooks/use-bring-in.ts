'use client';

import { browserClock } from '@/lib/offline/browser-clock-edge';
import { browserSha256 } from '@/lib/offline/browser-sha256';
import { type BroughtIn, bringIn, isOwnFile } from '@/lib/offline/bring-in';
import { sealOp } from '@/lib/offline/make-op';
import type { Records } from '@/lib/offline/records';
import { type FileFault, type UnsentFile, readUnsentFile } from '@/lib/offline/unsent-file';
import { useRecords } from './use-standing';

/** What became of a file: taken in, or not, and why. `not-yours` names whose work it is. */
export type BringInResult =
  | ({ kind: 'done' } & BroughtIn)
  | { kind: 'not-yours'; displayName: string; teamName: string }
  | { kind: 'fault'; fault: FileFault };

/** Presses that the other phone could not store: they become operations here, under the ids they had. */
async function bringUnsaved(records: Records, { notSaved }: UnsentFile): Promise<void> {
  if (notSaved.length === 0) return;
  const ports = { sha256: browserSha256 };
  await records.commit({ drafts: await Promise.all(notSaved.map((draft) => sealOp(ports, draft))) });
}

async function take(records: Records, text: string): Promise<BringInResult> {
  const read = await readUnsentFile(browserSha256, text);
  if (!read.ok) return { kind: 'fault', fault: read.fault };
  const { file } = read;
  if (!isOwnFile(file, records.person)) return { kind: 'not-yours', ...file };
  const result = await bringIn(records.store, file, browserClock.now());
  await bringUnsaved(records, file);
  records.wake('manual');
  return { kind: 'done', ...result };
}

/** Takes in a copy of unsent work that another phone made; null while no records are open. */
export function useBringIn(): ((text: string) => Promise<BringInResult>) | null {
  const records = useRecords();
  return records && ((text) => take(records, text));
}
