import type { RecordsDatabase } from './dexie-database';
import { foldReadings } from './fold-readings';
import type { LocalOp } from './local-op';

/**
 * The latest second reading that this person began at a visit, as far as this browser holds it.
 *
 * @param me the user id of the person.
 */
export async function readOwnSecond(db: RecordsDatabase, me: string, visit: string): Promise<string | null> {
  const isOutline = ({ kind }: LocalOp) => kind === 'reading.open' || kind === 'reading.submit';
  const rows = await db.ops.where('visit').equals(visit).filter(isOutline).toArray();
  return foldReadings(rows, me).findLast(({ mine, kind }) => mine && kind === 'second')?.id ?? null;
}
