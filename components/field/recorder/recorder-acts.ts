import { type Axial, cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import type { PressDetail, Recorder, RecorderMark, RecorderView, Toggles } from '@/lib/offline/recorder-view';

const TOGGLES = ['nectar', 'unsure', 'reused', 'scrap'] as const satisfies readonly (keyof Toggles)[];

/** The mark of the current cell, if it bears one already. */
export function currentMark({ current, marks }: Pick<RecorderView, 'current' | 'marks'>): RecorderMark | null {
  return (current && marks.get(cellKey(current))) ?? null;
}

/** The toggles to show: those of the current cell's mark, or those waiting for the next press when it bears none. */
export function shownToggles(view: Pick<RecorderView, 'current' | 'marks' | 'toggles'>): Toggles {
  const mark = currentMark(view);
  if (!mark) return view.toggles;
  const { nectar, unsure, reused, scrap } = mark;
  return { nectar, unsure, reused, scrap };
}

/** Turns over whatever must be turned over for the waiting toggles to become `wanted`. */
function alignToggles({ view, toggle }: Recorder, wanted: Toggles): void {
  for (const name of TOGGLES) if (view.toggles[name] !== wanted[name]) toggle(name);
}

/**
 * Marks the current cell with a state. A cell that bears a mark keeps its toggles and note, because only the state is
 * being corrected; its instar goes with the old state.
 */
export function pressState(recorder: Recorder, state: CellState, detail: PressDetail = {}): void {
  const mark = currentMark(recorder.view);
  alignToggles(recorder, shownToggles(recorder.view));
  const instar = mark && mark.state === state ? mark.instar : null;
  recorder.press(state, { note: mark?.note ?? null, instar, ...detail });
}

/** Marks the current cell anew in its own state with other toggles, note or instar, and stays on it. */
function remark(recorder: Recorder, toggles: Toggles, detail: PressDetail): void {
  const mark = currentMark(recorder.view);
  if (!mark) return;
  alignToggles(recorder, toggles);
  recorder.press(mark.state, { note: mark.note, instar: mark.instar, ...detail });
  recorder.jump({ q: mark.q, r: mark.r });
}

/** Turns a toggle over: at once on a cell that bears a mark, else for the next press. */
export function flipToggle(recorder: Recorder, name: keyof Toggles): void {
  if (!currentMark(recorder.view)) return recorder.toggle(name);
  const shown = shownToggles(recorder.view);
  remark(recorder, { ...shown, [name]: !shown[name] }, {});
}

/** Puts a note or an instar on a cell that bears a mark already. */
export function putDetail(recorder: Recorder, detail: PressDetail): void {
  remark(recorder, shownToggles(recorder.view), detail);
}

/** Marks a cell that bears a mark as unsure; the walk goes on from where it was. */
export function markUnsure(recorder: Recorder, cell: Axial): void {
  const mark = recorder.view.marks.get(cellKey(cell));
  if (!mark) return;
  const { nectar, reused, scrap, note, instar, state } = mark;
  alignToggles(recorder, { nectar, reused, scrap, unsure: true });
  recorder.jump(cell);
  recorder.press(state, { note, instar });
}

/**
 * Paints one cell. A cell that bears a mark keeps its toggles and note, as it does when its state is pressed; one that
 * bears this state already is left alone.
 */
export function paintCell(recorder: Recorder, cell: Axial, state: CellState): void {
  const mark = recorder.view.marks.get(cellKey(cell));
  if (!mark) return recorder.paint(cell, state);
  if (mark.state === state) return;
  const { nectar, unsure, reused, scrap, note } = mark;
  alignToggles(recorder, { nectar, unsure, reused, scrap });
  recorder.jump(cell);
  recorder.press(state, { note, instar: null });
}
