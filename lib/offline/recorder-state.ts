import { type Axial, cellKey, parseCellKey } from '@/lib/comb/axial';
import { liveMarks } from '@/lib/comb/live-marks';
import type { Mark } from '@/lib/comb/mark';
import { type Tally, tallyOf } from '@/lib/comb/tally';
import { nextCell, rimCells } from '@/lib/comb/walk-order';
import { formatHlc, parseHlc, tickHlc } from '@/lib/kit/hlc';
import type { Op } from '@/lib/protocol/op';
import type { NotSavedReason } from './not-saved';
import { markWords, undoWords } from './op-words';
import type { RecorderMark, RecorderPlace, RecorderView, Toggles } from './recorder-view';

/** Everything the recorder of one reading knows. Never changed in place. */
export interface RecorderState {
  reading: string;
  nest: string;
  visit: string;
  mayMark: boolean;
  submitted: boolean;
  /** All marks of the reading in the order they were made, also replaced and retracted ones. */
  marks: readonly Mark[];
  retracted: ReadonlySet<string>;
  /** Live marks of the last visit's reading, by cell. */
  last: ReadonlyMap<string, Mark>;
  place: RecorderPlace;
  /** Ids of operations whose transaction has not completed, in order. */
  pending: readonly string[];
  /** Why the last attempt to save failed; null while one may still succeed. */
  failure: NotSavedReason | null;
  /** Operations of this reading that are in the storage. */
  saved: number;
  lastWords: string | null;
}

/** All toggles off. */
export const NO_TOGGLES: Toggles = { nectar: false, unsure: false, reused: false, scrap: false };

/** Where a reading begins. */
export function startPlace(reading: string): RecorderPlace {
  return { reading, jump: null, skipped: [], expectedTotal: null, toggles: NO_TOGGLES };
}

/** The live mark of a cell. */
export function liveMarkAt({ marks, retracted }: Pick<RecorderState, 'marks' | 'retracted'>, cell: Axial): Mark | null {
  const own = marks.filter(({ q, r }) => q === cell.q && r === cell.r);
  return liveMarks(own, retracted)[0] ?? null;
}

/** The marks of a cell that nobody has taken back, replaced ones included. */
export function marksAt({ marks, retracted }: Pick<RecorderState, 'marks' | 'retracted'>, cell: Axial): Mark[] {
  return marks.filter(({ q, r, opId }) => q === cell.q && r === cell.r && !retracted.has(opId));
}

/** A clock reading after every mark on the screen; the transaction puts the final one in its place. */
export function provisionalHlc({ marks }: Pick<RecorderState, 'marks'>, now: number): string {
  const latest = marks.at(-1)?.hlc ?? '';
  return formatHlc(tickHlc(parseHlc(latest) ?? { ms: 0, counter: 0 }, now));
}

/** What changes when a transaction with these operations has completed. */
export function afterSaving(state: RecorderState, ops: readonly Op[]): Partial<RecorderState> {
  const done = new Set(ops.map((op) => op.opId));
  const pending = state.pending.filter((opId) => !done.has(opId));
  return { pending, failure: null, saved: state.saved + ops.length };
}

/** The mark that would be live at a cell once this one is taken back. */
export function markBefore(state: Pick<RecorderState, 'marks' | 'retracted'>, mark: Mark): Mark | null {
  return liveMarkAt({ marks: state.marks, retracted: new Set([...state.retracted, mark.opId]) }, mark);
}

/** The cell the next press is about. */
function currentCell({ place, last }: RecorderState, live: readonly Mark[]): Axial | null {
  const { jump, skipped, expectedTotal } = place;
  if (jump) return jump;
  return nextCell({ known: last.values(), marked: live, skipped: skipped.map(parseCellKey), expectedTotal });
}

/** Free addresses around marked and known cells, without those found missing. */
function rimOf({ place, last }: RecorderState, live: readonly Mark[]): Axial[] {
  const skipped = new Set(place.skipped);
  const known = [...last.values()].filter((cell) => !skipped.has(cellKey(cell)));
  return rimCells([...live, ...known]).filter((cell) => !skipped.has(cellKey(cell)));
}

function unsavedOf({ failure, pending, marks }: RecorderState): RecorderView['unsaved'] {
  if (!failure) return [];
  const byId = new Map(marks.map((mark) => [mark.opId, mark]));
  return pending.map((opId) => {
    const mark = byId.get(opId);
    return { opId, words: mark ? markWords(mark) : 'A change to this reading', reason: failure };
  });
}

/** What follows from the marks and the place alone: it stays the same while presses reach the disk. */
export interface CombState {
  live: readonly Mark[];
  current: Axial | null;
  rim: readonly Axial[];
  skipped: ReadonlySet<string>;
  tally: Tally;
  /** The live mark that the next undo takes back: the one made last. */
  undoTarget: Mark | null;
  undoWords: string | null;
}

/** Derives the comb. */
export function combState(state: RecorderState): CombState {
  const live = liveMarks(state.marks, state.retracted);
  const ids = new Set(live.map((mark) => mark.opId));
  const undoTarget = state.marks.findLast((mark) => ids.has(mark.opId)) ?? null;
  return {
    live,
    current: currentCell(state, live),
    rim: rimOf(state, live),
    skipped: new Set(state.place.skipped),
    tally: tallyOf(live),
    undoTarget,
    undoWords: undoTarget && undoWords(undoTarget, markBefore(state, undoTarget)?.state ?? null),
  };
}

/** Does a change of these members leave the comb as it was? */
export function keepsComb(part: Partial<RecorderState>): boolean {
  return !('marks' in part || 'retracted' in part || 'place' in part || 'last' in part);
}

/** The live marks as the screen draws them; what has not changed since the last drawing is the same object. */
function drawnMarks(live: readonly Mark[], pending: ReadonlySet<string>, before?: RecorderView['marks']) {
  const drawn = new Map<string, RecorderMark>();
  for (const mark of live) {
    const key = cellKey(mark);
    const saved = !pending.has(mark.opId);
    const same = before?.get(key);
    drawn.set(key, same?.opId === mark.opId && same.saved === saved ? same : { ...mark, saved });
  }
  return drawn;
}

/**
 * What the screen draws.
 *
 * @param before what it drew last.
 */
export function recorderView(state: RecorderState, comb: CombState, before?: RecorderView): RecorderView {
  const { reading, nest, visit, submitted, mayMark, last, place, failure, saved, lastWords } = state;
  const { live, current, rim, skipped, tally, undoWords: words } = comb;
  const pending = new Set(state.pending);
  return {
    ...{ reading, nest, visit, submitted, mayMark, last, saved, lastWords },
    ...{ current, rim, skipped, tally, undoWords: words },
    marks: drawnMarks(live, pending, before?.marks),
    expectedTotal: place.expectedTotal,
    toggles: place.toggles,
    pending: failure ? 0 : pending.size,
    unsaved: unsavedOf(state),
  };
}
