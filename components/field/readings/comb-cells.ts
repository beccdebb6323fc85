import type { CombCellView } from '@/components/comb/comb-view';
import type { Mark } from '@/lib/comb/mark';

/** One mark as the drawing needs it. `saved: false` draws the cell as not yet kept. */
export function cellOfMark(mark: Mark & { saved?: boolean }): CombCellView {
  const { q, r, state, nectar, unsure, reused, scrap, note, saved } = mark;
  return { q, r, state, nectar, unsure, reused, scrap, noted: note !== null, pending: saved === false };
}

/** All marks of a reading as cells to draw. */
export function cellsOfMarks(marks: Iterable<Mark & { saved?: boolean }>): CombCellView[] {
  return Array.from(marks, cellOfMark);
}
