import 'server-only';
import { accessSync, constants, mkdirSync } from 'node:fs';
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
  const epoch = await storedEpoch().catch(() => null);
  const photos = canStorePhotos();
  const ok = epoch !== null && photos && epochAgrees(epoch);
  return { ok, db: epoch !== null, photos, epoch };
}
