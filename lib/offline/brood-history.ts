import type { BroodReading } from '@/lib/brood/input';
import { foldMarks, liveByCell } from './fold-readings';
import type { LocalOp } from './local-op';
import type { ReadingSummary, VisitView } from './nest-view';

/** What this phone knows of a nest's brood at one visit. */
export interface BroodHistory {
  /** When the visit began, epoch milliseconds. */
  visitAt: number;
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
 * The readings that an estimate at a visit can start from. Those of the visit itself are left to the caller, or one
 * reader would be told what another has found.
 *
 * @param visits of one nest, oldest first.
 * @param rows all operations of the nest.
 * @returns null when the visit is not among them.
 */
export function broodHistory(
  visits: readonly VisitView[],
  visit: string,
  rows: readonly LocalOp[],
): BroodHistory | null {
  const here = visits.findIndex(({ id }) => id === visit);
  const present = visits[here];
  if (!present) return null;
  const earlier = visits.slice(0, here).map((before) => readingOf(before, rows));
  return { visitAt: Date.parse(present.startedAt), earlier: earlier.filter((reading) => reading !== null) };
}
