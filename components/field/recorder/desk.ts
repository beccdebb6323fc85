import { stepFrom, type Step } from '@/components/comb/comb-steps';
import { type Axial, cellKey, parseCellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';
import type { PressDetail, Recorder, RecorderView } from '@/lib/offline/recorder-view';
import type { RecorderCommand } from './key-map';
import { currentMark, flipToggle, paintCell, pressState } from './recorder-acts';

/** How presses are understood: the walk names the cell, or one state is painted on the cells that are tapped. */
export type Mode = { kind: 'walk' } | { kind: 'paint'; state: CellState };

/** The recorder with the mode of the screen around it. */
export interface Desk {
  recorder: Recorder;
  mode: Mode;
  setMode: (mode: Mode) => void;
  /** Note and instar that wait for the state of the current cell, when it bears no mark yet. */
  detail: PressDetail;
  setDetail: (detail: PressDetail) => void;
  /** Asks whether a cell that bears a mark is to be taken off the comb. */
  askNoCell: () => void;
}

/** Every place one can step to: marked cells, cells known from the last visit, and open places on the rim. */
export function stopsOf({
  marks,
  last,
  rim,
  skipped,
}: Pick<RecorderView, 'marks' | 'last' | 'rim' | 'skipped'>): Axial[] {
  const keys = new Set([...marks.keys(), ...last.keys(), ...rim.map(cellKey)]);
  return [...keys].filter((key) => marks.has(key) || !skipped.has(key)).map(parseCellKey);
}

/** Where a step leads from the current cell; from the last marked one when the walk is over. */
export function stepTo(view: RecorderView, step: Step): Axial | null {
  const from = view.current ?? [...view.marks.values()].at(-1) ?? null;
  if (!from) return null;
  const to = stepFrom(from, step, stopsOf(view));
  return cellKey(to) === cellKey(from) ? null : to;
}

/** One cell forward (1) or back (−1) in the walk from the current cell; null past either end. One pass, no sorting. */
export function besideInWalk(view: RecorderView, way: 1 | -1): Axial | null {
  const from = view.current ? cellNumber(view.current) : Number.POSITIVE_INFINITY;
  let nearest: Axial | null = null;
  for (const place of stopsOf(view)) {
    if ((cellNumber(place) - from) * way <= 0) continue;
    if (!nearest || (cellNumber(place) - cellNumber(nearest)) * way < 0) nearest = place;
  }
  return nearest;
}

/** A state was pressed: it marks the current cell, or becomes the one to paint with. */
export function chooseState({ recorder, mode, setMode, detail }: Desk, state: CellState): void {
  if (mode.kind === 'paint') setMode({ kind: 'paint', state });
  else pressState(recorder, state, currentMark(recorder.view) ? {} : detail);
}

/** A place of the picture was pressed: painted, gone to, or opened again after "no cell here". */
export function pressPlace({ recorder, mode }: Desk, place: Axial): void {
  if (mode.kind === 'paint') paintCell(recorder, place, mode.state);
  else if (recorder.view.skipped.has(cellKey(place))) recorder.unskip(place);
  else recorder.jump(place);
}

/** There is no cell here. On a cell that bears a mark that is asked first, because undo cannot bring its marks back. */
export function pressNoCell({ recorder, mode, askNoCell }: Desk): void {
  if (mode.kind === 'paint' || !recorder.view.current) return;
  if (currentMark(recorder.view)) askNoCell();
  else recorder.skip();
}

/** Does what a keyboard key asks. */
export function runCommand(desk: Desk, command: RecorderCommand): void {
  const { recorder } = desk;
  if (command.do === 'mark') return chooseState(desk, command.state);
  if (command.do === 'toggle') return desk.mode.kind === 'walk' ? flipToggle(recorder, command.mark) : undefined;
  if (command.do === 'undo') return recorder.undo();
  if (command.do === 'no-cell') return pressNoCell(desk);
  const to = stepTo(recorder.view, command.step);
  if (to) recorder.jump(to);
}
