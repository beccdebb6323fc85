import type { ReactElement } from 'react';
import { axisWords, dateWords } from '@/components/ui/date-words';
import { dayTicks, isOn } from './day-scale';
import type { Plot } from './plot';
import type { ChartSpread } from './spread';

interface AxisProps {
  plot: Plot;
  /** Where the words stand, and down to where the lines reach. */
  y: number;
  from: number;
  to: number;
}

/** Dates of a chart with an upright line at each. */
export function DayAxis({ plot, y, from, to }: AxisProps): ReactElement {
  return (
    <g>
      {dayTicks(plot.scale, plot.ticks).map((tick) => (
        <g key={tick}>
          <line x1={plot.x(tick)} x2={plot.x(tick)} y1={from} y2={to} stroke="var(--rule)" strokeWidth="1" />
          <text x={plot.x(tick)} y={y} textAnchor="middle" fontSize="13" fill="var(--ink)">
            {axisWords(tick)}
          </text>
        </g>
      ))}
    </g>
  );
}

interface AsOfProps {
  plot: Plot;
  asOf: string;
  from: number;
  to: number;
}

/** The day an estimate speaks for: a dashed line with its date below; nothing when it lies off the chart. */
export function AsOfLine({ plot, asOf, from, to }: AsOfProps): ReactElement | null {
  if (!isOn(plot.scale, asOf)) return null;
  const x = plot.x(asOf);
  const anchor = x > plot.width - 60 ? 'end' : 'middle';
  return (
    <g>
      <line x1={x} x2={x} y1={from} y2={to} stroke="var(--ink)" strokeWidth="1.5" strokeDasharray="4 3" />
      <text x={x} y={to + 14} textAnchor={anchor} fontSize="13" fill="var(--ink)">
        {dateWords(asOf)}
      </text>
    </g>
  );
}

interface RangeLineProps {
  plot: Plot;
  spread: ChartSpread;
  y: number;
  stroke?: string;
}

const WIDTHS = [
  ['p95', 1.5],
  ['p80', 3.5],
  ['p50', 6.5],
] as const;

/** An estimated date: thin over 95, stronger over 80, thick over 50 of 100, a gap at the likeliest day. */
export function RangeLine({ plot, spread, y, stroke = 'var(--ink)' }: RangeLineProps): ReactElement {
  const middle = plot.x(spread.median);
  return (
    <g>
      {WIDTHS.map(([range, width]) => (
        <line
          key={range}
          x1={plot.x(spread[range][0])}
          x2={Math.max(plot.x(spread[range][1]), plot.x(spread[range][0]) + 1)}
          y1={y}
          y2={y}
          stroke={stroke}
          strokeWidth={width}
        />
      ))}
      <line x1={middle} x2={middle} y1={y - 3.25} y2={y + 3.25} stroke="var(--paper)" strokeWidth="1.5" />
    </g>
  );
}
