import type { ReactElement } from 'react';
import { ShareTrend } from '@/components/charts/share-trend';
import { Disclosure } from '@/components/ui/disclosure';
import { STATE_WORDS } from '@/lib/comb/states';
import { monthsOf, type StateTrendView } from './agreement-shapes';
import { TrendRows } from './trend-rows';

/** Field and lab about each state, month by month: small charts, with the figures behind them one tap away. */
export function StateTrends({ states }: { states: readonly StateTrendView[] }): ReactElement {
  const months = monthsOf(states);
  return (
    <ul className="grid gap-x-8 gap-y-7 sm:grid-cols-2 lg:grid-cols-3">
      {states.map(({ state, points }) => (
        <li key={state} className="keep-together">
          <h3 className="mb-2 font-bold first-letter:uppercase">{STATE_WORDS[state]}</h3>
          <ShareTrend title={STATE_WORDS[state]} months={months} points={points} floor={0} />
          <Disclosure
            summary={
              <>
                Figures<span className="sr-only"> for {STATE_WORDS[state]}</span>
              </>
            }
            className="mt-1"
          >
            <TrendRows caption={`Agreement about ${STATE_WORDS[state]}`} points={points} />
          </Disclosure>
        </li>
      ))}
    </ul>
  );
}
