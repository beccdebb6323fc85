import type { NestView, ReadingRow, VisitRow } from './lab-shapes';

/** A reading of a nest together with its visit. */
interface PlacedReading {
  visit: VisitRow;
  reading: ReadingRow;
}

const BEST_FIRST: readonly string[] = ['final', 'field', 'second'];

/** The readings of a nest one may see: latest visit first, and at one visit final before field before second. */
function readingsOf(nest: NestView): PlacedReading[] {
  const placed = nest.visits.flatMap((visit) => visit.readings.map((reading) => ({ visit, reading })));
  return placed
    .filter(({ reading }) => reading.tally !== null)
    .sort(
      (a, b) =>
        Date.parse(b.visit.startedAt) - Date.parse(a.visit.startedAt) ||
        BEST_FIRST.indexOf(a.reading.kind) - BEST_FIRST.indexOf(b.reading.kind),
    );
}

/** The reading a nest page shows: the one asked for when it is there, otherwise the best of the latest visit. */
export function shownReading(nest: NestView, asked: string | undefined): PlacedReading | null {
  const readings = readingsOf(nest);
  return readings.find(({ reading }) => reading.id === asked) ?? readings[0] ?? null;
}
