import type { ReactElement } from 'react';
import { percentWords } from '@/components/charts/share-trend';
import { countWords } from '@/components/ui/date-words';
import { monthWords } from '@/components/ui/month-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { TrendPointView } from './agreement-shapes';

/** The figures behind a chart, month by month. */
export function TrendRows({ caption, points }: { caption: string; points: readonly TrendPointView[] }): ReactElement {
  return (
    <Table caption={caption}>
      <thead>
        <tr>
          <HeadCell>Month</HeadCell>
          <HeadCell className="text-right">Agreed</HeadCell>
          <HeadCell className="text-right">95 % interval</HeadCell>
          <HeadCell className="text-right">n</HeadCell>
        </tr>
      </thead>
      <tbody>
        {points.map(({ month, share, interval, agreed, n, combs }) => (
          <tr key={month}>
            <BodyCell className="whitespace-nowrap">{monthWords(month)}</BodyCell>
            <BodyCell number className="whitespace-nowrap">
              {percentWords(share)}
            </BodyCell>
            <BodyCell number className="whitespace-nowrap">
              {Math.round(interval.low * 100)} to {percentWords(interval.high)}
            </BodyCell>
            <BodyCell className="text-right">
              <span className="font-mono">
                {agreed}/{n}
              </span>{' '}
              <span className="text-sm whitespace-nowrap text-quiet max-sm:hidden">in {countWords(combs, 'comb')}</span>
            </BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
