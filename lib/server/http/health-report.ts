import 'server-only';
import { accessSync, constants, mkdirSync } from 'node:fs';
import { setTimeout as wait } from 'node:timers/promises';
import { epochAgrees, storedEpoch } from '@/lib/server/commands/sync/server-epoch';
import { dataDir } from '@/lib/server/env';

/** What `GET /api/health` says; `ok` only when everything is. */
export interface HealthReport {
  ok: boolean;
  db: boolean;
  photos: boolean;
  /** Null when the database does not answer. */
  epoch: number | null;
}

/** A database that takes longer than this to answer one small question is not well. */
const PATIENCE_MS = 3_000;

/** The epoch, or null when the database is away or hangs. */
async function epochInTime(): Promise<number | null> {
  const given = new AbortController();
  const answer = storedEpoch().catch(() => null);
  const patience = wait(PATIENCE_MS, null, { signal: given.signal }).catch(() => null);
  const epoch = await Promise.race([answer, patience]);
  given.abort();
  return epoch;
}

/** Can the folder that holds the photos be written to? */
function canStorePhotos(): boolean {
  try {
    mkdirSync(dataDir(), { recursive: true });
    accessSync(dataDir(), constants.W_OK);
    return true;
  } catch {
    return false;
  }
}

/** Is the office fit to take work? Also no while a restore is not finished. */
export async function healthReport(): Promise<HealthReport> {
  const epoch = await epochInTime();
  const photos = canStorePhotos();
  const ok = epoch !== null && photos && epochAgrees(epoch);
  return { ok, db: epoch !== null, photos, epoch };
}
