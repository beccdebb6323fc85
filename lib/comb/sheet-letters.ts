import type { MarkContent } from './mark';
import { CELL_STATES, type CellState, STATE_LETTERS } from './states';
import { cellNumber, ring } from './walk';

/** What a typed sheet says about one cell. */
export type SheetMark = Pick<MarkContent, 'q' | 'r' | 'state' | 'nectar' | 'unsure'>;

/** Something typed that the sheet does not know. */
export interface SheetFault {
  /** Which ring the line is of. */
  ring: number;
  /** The number of the cell it stands at; null when the ring has no cell left for it. */
  cell: number | null;
  text: string;
}

/** One typed line, understood as far as it goes. */
export interface SheetLine {
  marks: SheetMark[];
  faults: SheetFault[];
  /** How many places of the ring the line speaks of, those without a cell too. */
  places: number;
}

/** Typed for a place of the ring where the comb has no cell. */
const NO_CELL = '.';

const STATES = new Map<string, CellState>([
  ...CELL_STATES.map((state) => [STATE_LETTERS[state], state] as const),
  ['–', 'empty'],
  ['—', 'empty'],
]);

/** A letter with the marks behind it: `o'` is an egg with nectar, `c?` a cap one is not sure of. */
const TOKEN = /([^\s,;'’?])(['’?]*)/gu;

/**
 * Reads one line of a paper sheet: a letter a cell, in the order of the printed numbers. White space and commas between
 * them mean nothing; `.` passes a place without a cell. A letter the sheet does not know is a fault and keeps its place.
 *
 * @param k the ring, 0 for the pedicel cell.
 */
export function readSheetLine(k: number, text: string): SheetLine {
  const cells = ring(k);
  const line: SheetLine = { marks: [], faults: [], places: 0 };
  for (const [, letter = '', signs = ''] of text.matchAll(TOKEN)) {
    const cell = cells[line.places];
    line.places += 1;
    const state = STATES.get(letter.toLowerCase());
    if (!cell) line.faults.push({ ring: k, cell: null, text: letter });
    else if (state) line.marks.push({ ...cell, state, nectar: /['’]/.test(signs), unsure: signs.includes('?') });
    else if (letter !== NO_CELL) line.faults.push({ ring: k, cell: cellNumber(cell), text: letter });
  }
  return line;
}

/** Reads a whole sheet, one line a ring, ring 0 first. */
export function readSheet(lines: readonly string[]): SheetLine[] {
  return lines.map((text, k) => readSheetLine(k, text));
}
