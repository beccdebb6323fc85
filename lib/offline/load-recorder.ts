import { compareMarks } from '@/lib/comb/live-marks';
import { foldMarks, liveByCell } from './fold-readings';
import { foldVisits } from './fold-visits';
import type { LocalOp } from './local-op';
import type { VisitView } from './nest-view';
import { type RecorderState, startPlace } from './recorder-state';
import type { Store } from './store';

/**
 * The reading that the last map comes from: of the latest earlier visit that has one with live marks.
 * Readings of the same visit never count, nor hidden ones, or one reader would see what the other has found.
 */
function lastMap(visits: readonly VisitView[], visit: string, rows: readonly LocalOp[]): RecorderState['last'] {
  const here = visits.findIndex(({ id }) => id === visit);
  for (const earlier of visits.slice(0, Math.max(0, here)).reverse()) {
    for (const { id } of earlier.readings.filter(({ blind }) => !blind).reverse()) {
      const cells = liveByCell(foldMarks(rows.filter((row) => row.reading === id)));
      if (cells.size > 0) return cells;
    }
  }
  return new Map();
}

/**
 * Reads everything the recorder of one reading needs: its marks, the place where the person left it, and the last map.
 *
 * @param me the user id of the person at the phone.
 * @returns null when the reading is not on this phone.
 */
export async function loadRecorder(store: Store, me: string, reading: string): Promise<RecorderState | null> {
  const own = await store.opsOfReading(reading);
  const opening = own.find((row) => row.kind === 'reading.open');
  if (!opening?.nest || !opening.visit) return null;
  const { nest, visit, actor } = opening;
  const { marks, retracted } = foldMarks(own);
  const [rows, place] = await Promise.all([store.opsOfNest(nest), store.place(reading)]);
  return {
    reading,
    nest,
    visit,
    mayMark: actor === me,
    submitted: own.some((row) => row.kind === 'reading.submit'),
    marks: marks.sort(compareMarks),
    retracted,
    last: lastMap(foldVisits(rows, me), visit, rows),
    place: place ?? startPlace(reading),
    pending: [],
    failure: null,
    saved: own.filter((row) => row.kind === 'cell.mark' || row.kind === 'cell.retract').length,
    lastWords: null,
  };
}
