import type { RecordsDatabase } from './dexie-database';
import { inState } from './dexie-store';
import { OUTLINE_KINDS, foldNests } from './fold-nests';
import { foldReading, foldReadings } from './fold-readings';
import { foldVisits } from './fold-visits';
import type { LocalOp } from './local-op';
import type { NestSummary, NestView, ReadingView, VisitView } from './nest-view';

/** Operations that are not at the office yet, whatever they are about. */
async function waitingOps(db: RecordsDatabase): Promise<LocalOp[]> {
  const [queued, suspect] = await Promise.all([
    inState(db, 'queued', 'n').toArray(),
    inState(db, 'suspect', 'n').toArray(),
  ]);
  return [...queued, ...suspect];
}

/** All nests on this phone, the latest visited first. */
export async function readNests(db: RecordsDatabase, me: string): Promise<NestSummary[]> {
  const outline = await db.ops
    .where('kind')
    .anyOf([...OUTLINE_KINDS])
    .toArray();
  const rows = new Map([...outline, ...(await waitingOps(db))].map((row) => [row.key, row]));
  return foldNests([...rows.values()], me);
}

/** One nest with its visits; null when it is not on this phone. */
export async function readNest(db: RecordsDatabase, me: string, id: string): Promise<NestView | null> {
  const rows = await db.ops.where('nest').equals(id).toArray();
  return foldNests(rows, me).find((nest) => nest.id === id) ?? null;
}

/** One visit with its readings; null when it is not on this phone. */
export async function readVisit(db: RecordsDatabase, me: string, id: string): Promise<VisitView | null> {
  const rows = await db.ops.where('visit').equals(id).toArray();
  return foldVisits(rows, me).find((visit) => visit.id === id) ?? null;
}

/** One reading with its live marks; null when it is not on this phone. */
export async function readReading(db: RecordsDatabase, me: string, id: string): Promise<ReadingView | null> {
  const rows = await db.ops.where('reading').equals(id).toArray();
  const visit = rows.find((row) => row.kind === 'reading.open')?.visit;
  if (!visit) return null;
  const isOutline = ({ kind }: LocalOp) => kind === 'reading.open' || kind === 'reading.submit';
  const beside = await db.ops.where('visit').equals(visit).filter(isOutline).toArray();
  const summary = foldReadings(beside, me).find((reading) => reading.id === id);
  return summary ? foldReading(summary, rows) : null;
}
