import type { CellEstimate, DateRange, EmergenceRange } from '@/lib/brood/answer';
import type { CellState } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';

/** One strip of the brood chart: the cells whose brood has the same dates. */
export interface BroodRow {
  /** Cell numbers, rising. */
  cells: number[];
  state: CellState;
  laid: DateRange;
  capped: DateRange | null;
  emerges: EmergenceRange | null;
}

/** The dates of one estimate as text: equal text, equal strip. */
function sameness({ state, laid, capped, emerges }: CellEstimate): string {
  return JSON.stringify([state, laid, capped, emerges]);
}

/**
 * The strips of a nest, oldest brood first: cells with equal state and equal dates share one.
 * Cells that hold no datable brood are left out.
 */
export function broodRows(estimates: readonly CellEstimate[]): BroodRow[] {
  const rows = new Map<string, BroodRow>();
  for (const estimate of estimates) {
    const { state, laid, capped, emerges } = estimate;
    if (!laid) continue;
    const key = sameness(estimate);
    const row = rows.get(key) ?? { cells: [], state, laid, capped, emerges };
    row.cells.push(cellNumber(estimate));
    rows.set(key, row);
  }
  for (const row of rows.values()) row.cells.sort((a, b) => a - b);
  return [...rows.values()].sort((a, b) => Date.parse(a.laid.median) - Date.parse(b.laid.median));
}
