import 'server-only';
import { database } from '@/lib/server/db/database';
import { readDataFile, writeDataFile } from '@/lib/server/env';
import { HttpProblem } from '@/lib/server/http/problem';

/** The file, outside the database, that the epoch must agree with. */
const EPOCH_FILE = 'epoch';

/** Long enough that phones do not ask in vain while somebody finishes a restore. */
const RESTORING_RETRY_SECONDS = '60';

/** The number of this incarnation of the data, as the database has it. */
export async function storedEpoch(): Promise<number> {
  const row = await database().models.ServerState.findByPk(1);
  if (!row) throw new Error('The database has no server_state row. Run the migrations.');
  return row.epoch;
}

/** Does the database agree with the data folder? The first server on a new folder writes the number down. */
export function epochAgrees(epoch: number): boolean {
  const kept = readDataFile(EPOCH_FILE);
  if (kept === null) writeDataFile(EPOCH_FILE, String(epoch));
  return kept === null || kept === String(epoch);
}

/**
 * The epoch, for routes that write: a database restored from a backup whose epoch was not moved on is read only,
 * because phones would take it for the data they already sent their work to.
 *
 * @throws HttpProblem `busy` until the restore is finished.
 */
export async function writableEpoch(): Promise<number> {
  const epoch = await storedEpoch();
  if (!epochAgrees(epoch)) throw new HttpProblem('busy', { headers: { 'Retry-After': RESTORING_RETRY_SECONDS } });
  return epoch;
}

/** The 409 of a phone that still speaks to the data before a restore. */
export function epochMismatch(epoch: number): HttpProblem {
  return new HttpProblem('epoch-mismatch', { members: { epoch } });
}
