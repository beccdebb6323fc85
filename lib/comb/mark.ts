import type { Axial } from './axial';
import type { CellState } from './states';

/** What a person records about one cell, without who, when and where. */
export interface MarkContent extends Axial {
  state: CellState;
  /** Stored nectar: sits with eggs, small larvae or in empty cells, and never counts in the stage sum. */
  nectar: boolean;
  /** The observer was not sure of the state. */
  unsure: boolean;
  /** New brood in a cell an adult has left. */
  reused: boolean;
  /** A scrap of prey lies in the cell. */
  scrap: boolean;
  /** Larval instar 1–5, when a reviewer gives it. */
  instar: number | null;
  note: string | null;
}

/** One observation of one cell, as it stands in a reading's history. */
export interface Mark extends MarkContent {
  opId: string;
  /** `"<ms>.<counter>"`; compared as two integers. */
  hlc: string;
  /** The mark this one replaces, when its author changed their mind. */
  supersedes: string | null;
  /** The wall time written on the phone, with its offset. */
  at: string;
}
