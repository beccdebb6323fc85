import { type CombCellView, type CombWindow, placeOf, PITCH } from '@/components/comb/comb-view';
import { cellOfMark } from '@/components/field/readings/comb-cells';
import { type Axial, cellKey, parseCellKey } from '@/lib/comb/axial';
import type { RecorderView } from '@/lib/offline/recorder-view';
import { type ExpectedStates, NOTHING_EXPECTED } from './expected-states';

/** The cells and free places to draw. */
export interface CombPart {
  cells: CombCellView[];
  ghosts: Axial[];
}

/** Does a window show (at least a piece of) this place? */
function shows({ centre, across, down }: CombWindow, place: Axial): boolean {
  const sideways = Math.abs(placeOf(place).x - placeOf(centre).x) / PITCH;
  return sideways <= across / 2 + 1 && Math.abs(place.r - centre.r) <= down / 2 + 1;
}

/** Cells of the last visit that bear no mark yet: drawn faint with what is expected there today, else as unread. */
function stillUnread({ last, marks, skipped }: RecorderView, expected: ExpectedStates): CombCellView[] {
  const keys = [...last.keys()].filter((key) => !marks.has(key) && !skipped.has(key));
  return keys.map((key) => {
    const state = expected.get(key);
    return { ...parseCellKey(key), ...(state ? { state, expected: true } : { state: 'unread' }) };
  });
}

/**
 * What of a comb to draw: all of it, or what a window shows. A press then costs the same at 500 cells as at 30.
 * Places said to hold no cell stay among the free ones, so that one can think again.
 */
export function combPart(
  view: RecorderView,
  window: CombWindow | null,
  expected: ExpectedStates = NOTHING_EXPECTED,
): CombPart {
  const isShown = (place: Axial): boolean => window === null || shows(window, place);
  const marked = [...view.marks.values()].filter(isShown).map(cellOfMark);
  const cells = [...marked, ...stillUnread(view, expected).filter(isShown)];
  const taken = new Set(cells.map(cellKey));
  const free = new Set([...view.rim.map(cellKey), ...view.skipped]);
  if (view.current) free.add(cellKey(view.current));
  const ghosts = [...free].filter((key) => !taken.has(key)).map(parseCellKey);
  return { cells, ghosts: ghosts.filter((place) => isShown(place) && !view.marks.has(cellKey(place))) };
}
