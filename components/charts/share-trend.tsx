import type { ReactElement } from 'react';
import { monthWords } from '@/components/ui/month-words';
import type { SharePoint } from './share-point';

const HEIGHT = 96;
/** Room above 100 % and below the floor, so that no mark is cut. */
const ROOM = 6;

interface ShareTrendProps {
  /** What the chart is about; begins its words. */
  title: string;
  /** All months of the page, so that charts below each other line up. */
  months: readonly string[];
  points: readonly SharePoint[];
  /** The share at the bottom edge. */
  floor: number;
}

/** `88 %` */
export function percentWords(share: number): string {
  return `${Math.round(share * 100)} %`;
}

/** The words that stand for the chart: first and last month, with their intervals. */
export function trendWords(title: string, points: readonly SharePoint[]): string {
  const said = ({ month, share, interval, n }: SharePoint): string =>
    `${monthWords(month)} ${percentWords(share)} (${percentWords(interval.low)} to ${percentWords(interval.high)}, ${n} cells)`;
  const [first, last] = [points[0], points.at(-1)];
  if (!first || !last) return `${title}: nothing to compare.`;
  return first === last ? `${title}: ${said(first)}.` : `${title}: from ${said(first)} to ${said(last)}.`;
}

/** The bottom edge that shows all intervals: half when they are all above it, else nothing. */
export function floorOf(points: readonly SharePoint[]): number {
  return points.every(({ interval }) => interval.low >= 0.5) ? 0.5 : 0;
}

/** Shares month by month: a point in a whisker over its 95 % interval. */
export function ShareTrend({ title, months, points, floor }: ShareTrendProps): ReactElement {
  const x = (month: string): string => `${Math.round(((months.indexOf(month) + 0.5) / months.length) * 10_000) / 100}%`;
  const y = (share: number): number => ROOM + (HEIGHT - 2 * ROOM) * (1 - (share - floor) / (1 - floor));
  return (
    <div className="grid grid-cols-[3.2rem_minmax(0,1fr)] gap-x-2" role="img" aria-label={trendWords(title, points)}>
      <div className="flex flex-col justify-between text-right font-mono text-sm leading-none">
        <span>100 %</span>
        <span>{percentWords(floor)}</span>
      </div>
      <svg width="100%" height={HEIGHT} className="block border-b-2 border-l-2 border-ink">
        <line x1="0" x2="100%" y1={y(1)} y2={y(1)} stroke="var(--rule)" />
        <line x1="0" x2="100%" y1={y((1 + floor) / 2)} y2={y((1 + floor) / 2)} stroke="var(--rule)" />
        {points.map(({ month, share, interval }) => (
          <g key={month} stroke="var(--main)" strokeWidth="2.5">
            <line x1={x(month)} x2={x(month)} y1={y(interval.high)} y2={y(interval.low)} />
            <circle cx={x(month)} cy={y(share)} r="5" fill="var(--paper)" />
          </g>
        ))}
      </svg>
      <span />
      <div className="flex text-center text-sm text-quiet" aria-hidden="true">
        {months.map((month) => (
          <span key={month} className="min-w-0 flex-1">
            {monthWords(month).slice(0, 3)}
          </span>
        ))}
      </div>
    </div>
  );
}
