import type { ReactElement } from 'react';
import { tallyWords } from '@/components/comb/comb-view';
import { countWords } from '@/components/ui/date-words';
import { FURTHER_STATES } from '@/lib/comb/states';
import type { Tally } from '@/lib/comb/tally';

/** What the keys cannot show: seldom states and nectar, `nectar in 2 · 1 other`. */
function besides(tally: Tally): string {
  const others = FURTHER_STATES.reduce((sum, state) => sum + tally[state], 0);
  const nectar = tally.nectarCells > 0 ? [`nectar in ${tally.nectarCells}`] : [];
  return [...nectar, ...(others > 0 ? [`${others} other`] : [])].join(' · ');
}

/** The head of the running tally; the six everyday counts stand on their keys. All of it is also there in words, unseen. */
export function TallyHead({ tally }: { tally: Tally }): ReactElement {
  return (
    <div className="min-w-0 flex-1 basis-24 leading-tight">
      <p className="sr-only">{tally.cellsTotal === 0 ? 'No cell marked yet' : tallyWords(tally).join(', ')}</p>
      <p aria-hidden="true" className="truncate text-xl font-bold">
        {countWords(tally.cellsTotal, 'cell')}
      </p>
      <p aria-hidden="true" className="truncate">
        {besides(tally)}
      </p>
    </div>
  );
}
