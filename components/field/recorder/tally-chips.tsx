import type { ReactElement } from 'react';
import { CellGlyph, MarkGlyph } from '@/components/comb/cell-glyph';
import { tallyWords } from '@/components/comb/comb-view';
import { CELL_STATES } from '@/lib/comb/states';
import type { Tally } from '@/lib/comb/tally';

/** The running tally: one small cell and a number for each state that was seen, nectar apart. Also in words, unseen. */
export function TallyChips({ tally }: { tally: Tally }): ReactElement {
  const seen = CELL_STATES.filter((state) => tally[state] > 0);
  return (
    <div className="min-w-0 flex-1">
      <p className="sr-only">{tally.cellsTotal === 0 ? 'No cell marked yet' : tallyWords(tally).join(', ')}</p>
      <div aria-hidden="true" className="flex flex-wrap gap-x-3 gap-y-0.5 leading-7 tabular-nums">
        {tally.cellsTotal === 0 && <span className="text-quiet">No cell marked yet</span>}
        {seen.map((state) => (
          <span key={state} className="inline-flex items-center gap-1">
            <CellGlyph state={state} size={24} />
            {tally[state]}
          </span>
        ))}
        {tally.nectarCells > 0 && (
          <span className="inline-flex items-center gap-1 border-l-2 border-rule pl-3">
            <MarkGlyph mark="nectar" size={22} />
            {tally.nectarCells}
          </span>
        )}
      </div>
    </div>
  );
}
