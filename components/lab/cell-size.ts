import { boxAround, cellsAcross, SMALLEST_MARKED_CELL } from '@/components/comb/comb-view';
import type { Axial } from '@/lib/comb/axial';

const LARGEST = 60;

/**
 * The width of a cell in CSS pixels so that a comb fits a column: at most 60, and never below the size at which
 * marks can still be read (a wide comb then scrolls sideways in its own box).
 */
export function cellSizeFor(cells: readonly Axial[], columnPx: number): number {
  const across = Math.max(1, cellsAcross(boxAround(cells)));
  return Math.round(Math.min(LARGEST, Math.max(SMALLEST_MARKED_CELL, columnPx / (across + 0.4))));
}
