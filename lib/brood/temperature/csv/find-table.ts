import { isTimeOfDay, writtenMoment } from './moment-text';
import { writtenNumber } from './number-text';
import { DELIMITERS, type Delimiter, type FileLine, splitCells, textLines } from './split-cells';

/** The table inside a file. */
export interface FoundTable {
  delimiter: Delimiter;
  /** The line with the names of the columns, where there is one. */
  header: FileLine | null;
  /** All lines below it, readable or not. */
  body: readonly FileLine[];
}

/** Enough lines to tell what a file is; the rest is read later. */
const LOOK_AT = 200;

/** Is this a line of data: a date and a number in different cells? */
function isData(cells: readonly string[]): boolean {
  const when = cells.findIndex((cell) => writtenMoment(cell) !== null);
  if (when < 0) return false;
  return cells.some((cell, i) => i !== when && !isTimeOfDay(cell) && writtenNumber(cell) !== null);
}

/** How many of the first lines are data when they are cut by a delimiter. */
function dataLines(lines: readonly { text: string }[], delimiter: Delimiter): number {
  return lines.slice(0, LOOK_AT).filter(({ text }) => isData(splitCells(text, delimiter))).length;
}

/** Names of columns: at least two cells with words, and no data in it. */
function isHeader(cells: readonly string[]): boolean {
  const words = cells.filter((cell) => /\p{L}/u.test(cell) && writtenMoment(cell) === null);
  return words.length >= 2 && !isData(cells);
}

/**
 * Finds the table in a text: which delimiter cuts most lines into data, and the names above it. Lines before them
 * (a logger's serial number, a title) are left out.
 *
 * @returns null when no line holds a date and a number.
 */
export function findTable(text: string): FoundTable | null {
  const lines = textLines(text);
  const scores = DELIMITERS.map((delimiter) => ({ delimiter, score: dataLines(lines, delimiter) }));
  // The first of equals wins: a comma may be a decimal sign, a tab or a semicolon is neither.
  const best = scores.reduce((a, b) => (b.score > a.score ? b : a));
  if (best.score === 0) return null;
  const { delimiter } = best;
  const table = lines.map(({ number, text: line }) => ({ number, cells: splitCells(line, delimiter) }));
  const first = table.findIndex(({ cells }) => isData(cells));
  const names = table[first - 1];
  return { delimiter, header: names && isHeader(names.cells) ? names : null, body: table.slice(first) };
}
