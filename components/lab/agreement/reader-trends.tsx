import type { ReactElement } from 'react';
import { ShareTrend, floorOf } from '@/components/charts/share-trend';
import { COMPARISON_WORDS, monthsOf, type ReaderTrendView } from './agreement-shapes';
import { TrendRows } from './trend-rows';

/** Every reader's agreement, month by month: a chart and its figures. */
export function ReaderTrends({ readers }: { readers: readonly ReaderTrendView[] }): ReactElement {
  const months = monthsOf(readers);
  const floor = floorOf(readers.flatMap(({ points }) => points));
  return (
    <ul className="flex flex-col gap-8">
      {readers.map(({ key, reader, comparison, points }) => {
        const title = `${reader}, ${COMPARISON_WORDS[comparison]}`;
        return (
          <li key={key} className="keep-together grid gap-x-8 gap-y-3 lg:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]">
            <h3 className="lg:col-span-2">
              <span className="font-bold">{reader}</span>{' '}
              <span className="text-quiet">{COMPARISON_WORDS[comparison]}</span>
            </h3>
            <ShareTrend title={title} months={months} points={points} floor={floor} />
            <TrendRows caption={title} points={points} />
          </li>
        );
      })}
    </ul>
  );
}
