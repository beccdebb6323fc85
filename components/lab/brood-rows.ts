import type { CellEstimate, DateRange, Spread } from '@/lib/brood/answer';
import type { CellState } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';

/** One strip of the brood chart: the cells whose brood has the same dates. */
export interface BroodRow {
  /** Cell numbers, rising. */
  cells: number[];
  state: CellState;
  laid: Spread;
  capped: Spread | null;
  emerges: Spread | null;
}

/** The local dates alone, which is all a page shows. */
function localSpread(range: DateRange): Spread;
function localSpread(range: DateRange | null): Spread | null;
function localSpread(range: DateRange | null): Spread | null {
  if (!range) return null;
  const { median, p50, p80, p95 } = range;
  return { median, p50, p80, p95 };
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
    const dates = { laid: localSpread(laid), capped: localSpread(capped), emerges: localSpread(emerges) };
    const row = rows.get(key) ?? { cells: [], state, ...dates };
    row.cells.push(cellNumber(estimate));
    rows.set(key, row);
  }
  for (const row of rows.values()) row.cells.sort((a, b) => a - b);
  return [...rows.values()].sort((a, b) => Date.parse(a.laid.median) - Date.parse(b.laid.median));
}
