import type { CombCellView } from '@/components/comb/comb-view';
import type { CellLines } from '@/components/lab/cell-lines';
import { estimateLines } from '@/components/lab/cell-lines';
import { spanWords } from '@/components/ui/date-words';
import type { BroodEstimate, CellEstimate, DateRange } from '@/lib/brood/answer';
import { cellKey } from '@/lib/comb/axial';

const DAY_MS = 86_400_000;

/** Whole days since the egg of a cell was most likely laid; null when it holds no brood that can be dated. */
function ageInDays({ laid }: Pick<CellEstimate, 'laid'>, asOf: string): number | null {
  return laid ? Math.max(0, Math.floor((Date.parse(asOf) - Date.parse(laid.utc.median)) / DAY_MS)) : null;
}

/** The comb as it was last seen by then, each brood with its age. */
export function ageCells({ cells, asOf }: Pick<BroodEstimate, 'cells' | 'asOf'>): CombCellView[] {
  return cells.map((cell) => {
    const age = ageInDays(cell, asOf);
    const { q, r, state } = cell;
    return age === null ? { q, r, state } : { q, r, state, ageDays: age };
  });
}

function widthLine(what: string, range: DateRange | null, year: string): string[] {
  if (!range) return [];
  return [`${what}: 50 in 100 between ${spanWords(range.p50, year)}, 95 in 100 between ${spanWords(range.p95, year)}`];
}

function furtherLines({ generation, lost, laid, capped, emerges }: CellEstimate, year: string): string[] {
  return [
    ...(laid ? [`Lost before that: probability ${lost.probability.toFixed(2)}`] : []),
    ...(generation > 1 ? [`Brood number ${generation} of this cell`] : []),
    ...widthLine('Laid', laid, year),
    ...widthLine('Capped', capped, year),
    ...widthLine('Adult', emerges, year),
  ];
}

/** What is said of each cell when it is picked: dates, chances, and what is odd about it. */
export function ageLines({ cells, flags }: Pick<BroodEstimate, 'cells' | 'flags'>, year: string): CellLines {
  const odd = new Map<string, string[]>();
  for (const { cell, text } of flags) {
    if (cell) odd.set(cellKey(cell), [...(odd.get(cellKey(cell)) ?? []), text]);
  }
  return Object.fromEntries(
    cells.map((cell) => {
      const dates = cell.laid ? estimateLines(cell, year) : ['No brood that can be dated'];
      return [cellKey(cell), [...dates, ...furtherLines(cell, year), ...(odd.get(cellKey(cell)) ?? [])]];
    }),
  );
}
