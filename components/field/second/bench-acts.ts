import { stepFrom } from '@/components/comb/comb-steps';
import { currentMark, pressState } from '@/components/field/recorder/recorder-acts';
import { type Axial, cellKey, neighbours, parseCellKey } from '@/lib/comb/axial';
import { compareMarks } from '@/lib/comb/live-marks';
import type { CellState } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';
import type { PressDetail, Recorder, RecorderMark, RecorderView, Toggles } from '@/lib/offline/recorder-view';
import type { BenchCommand } from './bench-keys';

/** What the bench remembers between presses; none of it is lost work when it goes. */
export interface BenchMemory {
  /** The cell marked last, by `cellKey`, while the walk leads: marks and digits typed after a letter belong to it. */
  just: string | null;
  /** Marks taken back, the latest at the end. */
  undone: readonly RecorderMark[];
  /** Why the last press did nothing, in words. */
  words: string | null;
}

/** A bench with nothing to remember. */
export const FRESH_MEMORY: BenchMemory = { just: null, undone: [], words: null };

/** What follows from a press: the memory after it. */
type Act = (recorder: Recorder, memory: BenchMemory) => BenchMemory;

const TOGGLE_NAMES = ['nectar', 'unsure', 'reused', 'scrap'] as const satisfies readonly (keyof Toggles)[];

const LARVA_OF: Readonly<Partial<Record<CellState, readonly number[]>>> = { small: [1, 2, 3], medium: [4], large: [5] };

/** Every place one can go to. */
function stopsOn({ marks, last, rim, skipped }: RecorderView): Axial[] {
  const keys = new Set([...marks.keys(), ...last.keys(), ...rim.map(cellKey)]);
  return [...keys].filter((key) => marks.has(key) || !skipped.has(key)).map(parseCellKey);
}

function saying(memory: BenchMemory, words: string): BenchMemory {
  return { ...memory, words };
}

/** The mark that marks and digits are about: the one just made, as on the paper sheet, else the current cell's. */
export function markInHand({ view }: Pick<Recorder, 'view'>, { just }: BenchMemory): RecorderMark | null {
  return (just === null ? undefined : view.marks.get(just)) ?? currentMark(view);
}

function align({ view, toggle }: Recorder, wanted: Toggles): void {
  for (const name of TOGGLE_NAMES) if (view.toggles[name] !== wanted[name]) toggle(name);
}

/** Marks a cell anew as it was, but for what changes, and leaves the walk where it is. */
function markAgain(recorder: Recorder, mark: RecorderMark, change: Partial<Toggles> & PressDetail): void {
  const { nectar, unsure, reused, scrap, note, instar } = { ...mark, ...change };
  const isHere = recorder.view.current !== null && cellKey(recorder.view.current) === cellKey(mark);
  align(recorder, { nectar, unsure, reused, scrap });
  recorder.jump({ q: mark.q, r: mark.r });
  recorder.press(mark.state, { note, instar });
  if (isHere) recorder.jump({ q: mark.q, r: mark.r });
}

function mark(state: CellState): Act {
  return (recorder, memory) => {
    const { current } = recorder.view;
    if (!current) return saying(memory, 'Every cell you counted has its mark. Go to a cell to change it.');
    pressState(recorder, state);
    return { just: cellKey(current), undone: [], words: null };
  };
}

function toggle(name: keyof Toggles): Act {
  return (recorder, memory) => {
    const inHand = markInHand(recorder, memory);
    if (inHand) markAgain(recorder, inHand, { [name]: !inHand[name] });
    else recorder.toggle(name);
    return { ...memory, undone: [], words: null };
  };
}

function setInstar(instar: number): Act {
  return (recorder, memory) => {
    const inHand = markInHand(recorder, memory);
    if (!inHand) return saying(memory, 'Mark the larva first, then type its instar.');
    if (!LARVA_OF[inHand.state]?.includes(instar)) {
      return saying(
        memory,
        `Cell ${cellNumber(inHand)} is no larva of instar ${instar}: 1 to 3 are small, 4 medium, 5 large.`,
      );
    }
    markAgain(recorder, inHand, { instar });
    return { ...memory, undone: [], words: null };
  };
}

const undo: Act = (recorder, memory) => {
  const newest = [...recorder.view.marks.values()].sort(compareMarks).at(-1);
  if (!newest) return saying(memory, 'There is nothing to take back.');
  recorder.undo();
  return { just: null, undone: [...memory.undone, newest], words: null };
};

const redo: Act = (recorder, memory) => {
  const again = memory.undone.at(-1);
  if (!again) return saying(memory, 'Nothing was taken back.');
  const { q, r, state, note, instar, nectar, unsure, reused, scrap } = again;
  align(recorder, { nectar, unsure, reused, scrap });
  recorder.jump({ q, r });
  recorder.press(state, { note, instar });
  return { just: cellKey(again), undone: memory.undone.slice(0, -1), words: null };
};

const noCell: Act = (recorder, memory) => {
  const here = currentMark(recorder.view);
  if (here) return saying(memory, `Cell ${cellNumber(here)} bears a mark. Take it back first.`);
  recorder.skip();
  return { ...memory, just: null, words: null };
};

/** Goes to a place; what is typed next is about it. */
export function goTo(recorder: Recorder, memory: BenchMemory, place: Axial): BenchMemory {
  if (recorder.view.skipped.has(cellKey(place))) recorder.unskip(place);
  else recorder.jump(place);
  return { ...memory, just: null, words: null };
}

/** Where the person stands: at the current cell, or at the last one of the walk when that is over. */
function standsAt({ current, marks }: RecorderView): Axial | null {
  return current ?? [...marks.values()].at(-1) ?? null;
}

function stepWith(find: (from: Axial, stops: readonly Axial[]) => Axial | undefined): Act {
  return (recorder, memory) => {
    const from = standsAt(recorder.view);
    const to = from && find(from, stopsOn(recorder.view));
    return to ? goTo(recorder, memory, to) : memory;
  };
}

function actOf(command: Exclude<BenchCommand, { do: 'finish' }>): Act {
  switch (command.do) {
    case 'mark':
      return mark(command.state);
    case 'toggle':
      return toggle(command.mark);
    case 'instar':
      return setInstar(command.instar);
    case 'undo':
      return undo;
    case 'redo':
      return redo;
    case 'no-cell':
      return noCell;
    case 'step':
      return stepWith((from, stops) => stepFrom(from, command.step, stops));
    case 'neighbour':
      return stepWith((from, stops) => {
        const wanted = neighbours(from)[command.way];
        return wanted && stops.find((stop) => cellKey(stop) === cellKey(wanted));
      });
  }
}

/** Does what a key asks; returns what to remember after it. */
export function runBench(
  recorder: Recorder,
  memory: BenchMemory,
  command: Exclude<BenchCommand, { do: 'finish' }>,
): BenchMemory {
  return actOf(command)(recorder, memory);
}
