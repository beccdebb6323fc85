import type { ReactElement } from 'react';
import { dayScale, isOn } from './day-scale';
import { labelRoom, type Plot, plotOf } from './plot';
import { AsOfLine, DayAxis, RangeLine } from './plot-parts';
import type { ChartSpread } from './spread';

/** One event of the nest, as its row is called. */
export interface NestDate {
  label: string;
  spread: ChartSpread;
}

interface NestDatesDrawingProps {
  dates: readonly NestDate[];
  /** Days on which the comb was read. */
  visits: readonly string[];
  asOf: string;
  width: number;
}

const HEAD = 22;
const ROW = 30;

function Visits({ visits, plot, y }: { visits: readonly string[]; plot: Plot; y: number }): ReactElement {
  return (
    <g>
      <text x="0" y={y + 5} fontSize="13" fill="var(--ink)">
        Read
      </text>
      {visits
        .filter((day) => isOn(plot.scale, day))
        .map((day) => (
          <path key={day} d={`M${plot.x(day) - 5} ${y - 5}h10l-5 9z`} fill="var(--ink)" />
        ))}
    </g>
  );
}

/** When the nest was founded, when the first adult is due, and when the comb was read; nothing without dates. */
export function NestDatesDrawing({ dates, visits, asOf, width }: NestDatesDrawingProps): ReactElement | null {
  const scale = dayScale([...dates.flatMap(({ spread }) => [...spread.p95]), ...(dates.length > 0 ? [asOf] : [])]);
  if (!scale) return null;
  const plot = plotOf(scale, width, labelRoom(width));
  const bottom = HEAD + (dates.length + 1) * ROW;
  const height = bottom + 20;
  return (
    <svg className="fig-svg" width={width} height={height} viewBox={`0 0 ${width} ${height}`}>
      <DayAxis plot={plot} y={14} from={HEAD} to={bottom} />
      {dates.map(({ label, spread }, index) => (
        <g key={label}>
          <text x="0" y={HEAD + index * ROW + 20} fontSize="13" fill="var(--ink)">
            {label}
          </text>
          <RangeLine plot={plot} spread={spread} y={HEAD + index * ROW + 15} />
        </g>
      ))}
      <Visits visits={visits} plot={plot} y={HEAD + dates.length * ROW + 15} />
      <AsOfLine plot={plot} asOf={asOf} from={HEAD} to={bottom} />
    </svg>
  );
}
