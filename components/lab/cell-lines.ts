import { rangeWords } from '@/components/ui/date-words';
import type { CellEstimate, DateRange } from '@/lib/brood/answer';
import { cellKey } from '@/lib/comb/axial';
import type { MarkView } from './lab-shapes';

/** What is said about a cell when it is picked on the comb: its estimated dates and its note, by cell key. */
export type CellLines = Readonly<Record<string, readonly string[]>>;

function dateLine(what: string, range: DateRange | null, inYear: string): string[] {
  if (!range) return [];
  const { day, range: ends } = rangeWords(range.median, range.p80, inYear);
  return [`${what} ${day}, ${ends}`];
}

/** The dates of one cell in words, each with its range. */
export function estimateLines({ laid, capped, emerges }: CellEstimate, inYear: string): string[] {
  return [
    ...dateLine('Laid', laid, inYear),
    ...dateLine('Capped', capped, inYear),
    ...dateLine('Adult comes out', emerges, inYear),
    ...(emerges ? [`If the brood lives: probability ${emerges.probability.toFixed(2)}`] : []),
  ];
}

/**
 * The lines for every cell of a reading.
 *
 * @param inYear the reader's year; dates of other years say theirs.
 */
export function cellLines(marks: readonly MarkView[], estimates: readonly CellEstimate[], inYear: string): CellLines {
  const byKey = new Map(estimates.map((estimate) => [cellKey(estimate), estimate]));
  return Object.fromEntries(
    marks.map((mark) => {
      const estimate = byKey.get(cellKey(mark));
      const note = mark.note === null ? [] : [`Note: ${mark.note}`];
      const instar = mark.instar === null ? [] : [`Instar ${mark.instar}`];
      return [cellKey(mark), [...instar, ...note, ...(estimate ? estimateLines(estimate, inYear) : [])]];
    }),
  );
}
