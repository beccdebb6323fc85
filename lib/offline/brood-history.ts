import type { BroodReading } from '@/lib/brood/input';
import { foldMarks, liveByCell } from './fold-readings';
import type { LocalOp } from './local-op';
import type { ReadingSummary, VisitView } from './nest-view';

/** What this phone knows of a nest's brood when a reading of it is made. */
export interface BroodHistory {
  /** When the visit began, epoch milliseconds. */
  visitAt: number;
  kind: ReadingSummary['kind'];
  /** One reading of each earlier visit that has one with marks, oldest first. */
  earlier: BroodReading[];
}

/** Readings made at the nest speak before those of the lab, handed-in ones before open ones, later before earlier. */
function bestFirst(a: ReadingSummary, b: ReadingSummary): number {
  const rank = ({ kind, submittedAt }: ReadingSummary) => (kind === 'field' ? 2 : 0) + (submittedAt === null ? 0 : 1);
  return rank(b) - rank(a) || Date.parse(b.openedAt) - Date.parse(a.openedAt);
}

function readingOf(visit: VisitView, rows: readonly LocalOp[]): BroodReading | null {
  for (const { id } of visit.readings.filter(({ blind }) => !blind).sort(bestFirst)) {
    const cells = liveByCell(foldMarks(rows.filter((row) => row.reading === id)));
    if (cells.size > 0) return { id, at: Date.parse(visit.startedAt), marks: [...cells.values()] };
  }
  return null;
}

/**
 * The readings that an estimate for a reading can start from. Those of its own visit are left out, or one reader would
 * be told what another has found.
 *
 * @param visits of one nest, oldest first.
 * @param reading the id of the reading that is being made.
 * @param rows all operations of the nest.
 * @returns null when the reading is not among them.
 */
export function broodHistory(
  visits: readonly VisitView[],
  reading: string,
  rows: readonly LocalOp[],
): BroodHistory | null {
  const here = visits.findIndex(({ readings }) => readings.some(({ id }) => id === reading));
  const present = visits[here];
  const own = present?.readings.find(({ id }) => id === reading);
  if (!present || !own) return null;
  const earlier = visits.slice(0, here).map((before) => readingOf(before, rows));
  return {
    visitAt: Date.parse(present.startedAt),
    kind: own.kind,
    earlier: earlier.filter((found) => found !== null),
  };
}
