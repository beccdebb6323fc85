import type { ReactElement } from 'react';
import { axisWords } from '@/components/ui/date-words';
import { type DayScale, dayTicks, percentOf } from './day-scale';

/** Dates along the top of a chart. Words keep their size on any width because places are given in percent. */
export function TimeAxis({ scale }: { scale: DayScale }): ReactElement {
  return (
    <svg width="100%" height="20" aria-hidden="true" className="block overflow-visible">
      {dayTicks(scale, 4).map((tick) => (
        <text key={tick} x={`${percentOf(scale, tick)}%`} y="14" textAnchor="middle" fontSize="13" fill="var(--ink)">
          {axisWords(tick)}
        </text>
      ))}
    </svg>
  );
}

/** Upright lines at the dates of the axis. */
export function TimeGrid({ scale, height }: { scale: DayScale; height: number }): ReactElement {
  return (
    <>
      {dayTicks(scale, 4).map((tick) => {
        const x = `${percentOf(scale, tick)}%`;
        return <line key={tick} x1={x} x2={x} y1="0" y2={height} stroke="var(--rule)" strokeWidth="1" />;
      })}
    </>
  );
}
