/** The separators a table may have. */
export const DELIMITERS = ['\t', ';', ','] as const;

/** What separates the cells of a line. */
export type Delimiter = (typeof DELIMITERS)[number];

/** One line of a file, with the number a person finds it by. */
export interface FileLine {
  /** Counted from 1. */
  number: number;
  cells: readonly string[];
}

/** Takes the next cell off a line: quoted text may hold the delimiter, and a doubled quote stands for one. */
const NEXT_CELL: Record<Delimiter, RegExp> = {
  '\t': /\s*"((?:[^"]|"")*)"[^\t]*(?:\t|$)|([^\t]*)(?:\t|$)/y,
  ';': /\s*"((?:[^"]|"")*)"[^;]*(?:;|$)|([^;]*)(?:;|$)/y,
  ',': /\s*"((?:[^"]|"")*)"[^,]*(?:,|$)|([^,]*)(?:,|$)/y,
};

/** The cells of one line, without space around them. */
export function splitCells(line: string, delimiter: Delimiter): string[] {
  const pattern = NEXT_CELL[delimiter];
  const cells: string[] = [];
  pattern.lastIndex = 0;
  // A line that ends in a delimiter has one more, empty cell after it, which nobody needs.
  while (pattern.lastIndex < line.length) {
    const match = pattern.exec(line);
    if (!match) break;
    cells.push((match[1]?.replaceAll('""', '"') ?? match[2] ?? '').trim());
  }
  return cells;
}

/** The lines of a text that are not empty, with their numbers. A byte order mark is dropped. */
export function textLines(text: string): { number: number; text: string }[] {
  return text
    .replace(/^\uFEFF/, '')
    .split(/\r\n|\n|\r/)
    .map((line, i) => ({ number: i + 1, text: line }))
    .filter((line) => line.text.trim() !== '');
}
