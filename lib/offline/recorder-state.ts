import { type Axial, cellKey, parseCellKey } from '@/lib/comb/axial';
import { liveMarks } from '@/lib/comb/live-marks';
import type { Mark } from '@/lib/comb/mark';
import { tallyOf } from '@/lib/comb/tally';
import { nextCell, rimCells } from '@/lib/comb/walk-order';
import { compareHlc, formatHlc, parseHlc, tickHlc } from '@/lib/kit/hlc';
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

/** The live mark that the next undo takes back: the one made last. */
export function undoTarget({ marks, retracted }: Pick<RecorderState, 'marks' | 'retracted'>): Mark | null {
  const live = new Set(liveMarks(marks, retracted).map((mark) => mark.opId));
  return marks.findLast((mark) => live.has(mark.opId)) ?? null;
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
  const latest = marks.reduce((max, mark) => (compareHlc(mark.hlc, max) > 0 ? mark.hlc : max), '0.0');
  return formatHlc(tickHlc(parseHlc(latest) ?? { ms: 0, counter: 0 }, now));
}

/** What changes when a transaction with these operations has completed: their marks get their final clock readings. */
export function afterSaving(state: RecorderState, ops: readonly Op[]): Partial<RecorderState> {
  const final = new Map(ops.map((op) => [op.opId, op.hlc]));
  const marks = state.marks.map((mark) => ({ ...mark, hlc: final.get(mark.opId) ?? mark.hlc }));
  const pending = state.pending.filter((opId) => !final.has(opId));
  return { marks: ops.length > 0 ? marks : state.marks, pending, failure: null, saved: state.saved + ops.length };
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

function undoWordsOf(state: RecorderState): string | null {
  const target = undoTarget(state);
  return target && undoWords(target, markBefore(state, target)?.state ?? null);
}

/** What the screen draws. */
export function recorderView(state: RecorderState): RecorderView {
  const live = liveMarks(state.marks, state.retracted);
  const pending = new Set(state.pending);
  const marks = new Map(
    live.map((mark): [string, RecorderMark] => [cellKey(mark), { ...mark, saved: !pending.has(mark.opId) }]),
  );
  return {
    reading: state.reading,
    nest: state.nest,
    visit: state.visit,
    submitted: state.submitted,
    mayMark: state.mayMark,
    current: currentCell(state, live),
    marks,
    last: state.last,
    rim: rimOf(state, live),
    skipped: new Set(state.place.skipped),
    expectedTotal: state.place.expectedTotal,
    toggles: state.place.toggles,
    tally: tallyOf(live),
    pending: state.failure ? 0 : state.pending.length,
    saved: state.saved,
    unsaved: unsavedOf(state),
    lastWords: state.lastWords,
    undoWords: undoWordsOf(state),
  };
}
