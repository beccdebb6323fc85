import type { Axial } from '@/lib/comb/axial';
import type { Mark } from '@/lib/comb/mark';
import type { CellState } from '@/lib/comb/states';
import type { Tally } from '@/lib/comb/tally';

/** The marks that ride along with the next press; they fall back to off after each press. */
export interface Toggles {
  nectar: boolean;
  unsure: boolean;
  reused: boolean;
  scrap: boolean;
}

/** Where a person is within a reading; kept with every press, so that a kill loses nothing. */
export interface RecorderPlace {
  reading: string;
  /** The cell a person jumped to; null while the walk decides. */
  jump: Axial | null;
  /** Addresses where there is no cell, by `cellKey`. */
  skipped: string[];
  /** How many cells the person counted on the comb; the walk ends there. */
  expectedTotal: number | null;
  toggles: Toggles;
}

/** One live mark in the recorder. `saved` turns true when its transaction has completed, never before. */
export interface RecorderMark extends Mark {
  saved: boolean;
}

/** A press that the phone could not keep. It stays in memory until it is retried or exported. */
export interface UnsavedPress {
  opId: string;
  /** "Cell 13: egg" */
  words: string;
  reason: 'full' | 'cleared' | 'timeout' | 'storage';
}

/** Everything the recorder screen draws. A new object after every change; equal parts keep their identity. */
export interface RecorderView {
  reading: string;
  nest: string;
  visit: string;
  submitted: boolean;
  /** False when someone else opened the reading; presses are then refused with an error. */
  mayMark: boolean;
  /** The cell the next press is about; null when the walk is over. */
  current: Axial | null;
  /** Live marks by `cellKey`, in walk order. */
  marks: ReadonlyMap<string, RecorderMark>;
  /** Live marks of the last visit's reading by `cellKey`: known cells, and a faint earlier state. */
  last: ReadonlyMap<string, Mark>;
  /** Free addresses that touch the comb: where a tap adds a cell. */
  rim: readonly Axial[];
  skipped: ReadonlySet<string>;
  expectedTotal: number | null;
  toggles: Toggles;
  tally: Tally;
  /** Presses whose transaction has not completed yet. */
  pending: number;
  /** Presses of this reading that are in the phone's storage. */
  saved: number;
  unsaved: readonly UnsavedPress[];
  /** What the last action did: "Cell 13: egg", "Cell 13 is unread again". */
  lastWords: string | null;
  /** What undo would do: "Cell 13 was unread"; null when there is nothing left to undo. */
  undoWords: string | null;
}

/** What a press may say beyond the state; the toggles fill in the rest. */
export interface PressDetail {
  note?: string | null;
  instar?: number | null;
}

/** The recorder's controls. Every one returns at once; `view.pending` and `view.unsaved` tell what became of it. */
export interface RecorderControls {
  /** Marks the current cell with the toggles and steps on. Does nothing when the walk is over. */
  press(state: CellState, detail?: PressDetail): void;
  /** Marks one named cell without moving the walk: paint, or correcting a neighbour. */
  paint(cell: Axial, state: CellState): void;
  /** Marks several cells in one transaction without moving the walk: all of them are kept, or none. */
  paintAll(cells: readonly (Axial & { state: CellState })[]): void;
  /** Turns one toggle over for the next press. */
  toggle(name: keyof Toggles): void;
  /** Makes a known cell or a rim address the current one; null gives the walk back the lead. */
  jump(cell: Axial | null): void;
  /** There is no cell at the current address; steps on. */
  skip(): void;
  /** Takes "no cell here" back and jumps there. */
  unskip(cell: Axial): void;
  /** Tells how many cells the comb has; null when unknown. */
  expect(total: number | null): void;
  /** Takes back the latest own live mark. Without limit, also after a restart. */
  undo(): void;
  /** Hands the reading in. Resolves when that is saved on the phone; rejects with `NotSavedError`. */
  submit(): Promise<void>;
  /** Tries to save every press in `view.unsaved` again. */
  retryUnsaved(): void;
}

/** What `useRecorder` returns once the reading is loaded. */
export interface Recorder extends RecorderControls {
  view: RecorderView;
}
