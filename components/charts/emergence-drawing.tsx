import type { ReactElement } from 'react';
import { dayScale } from './day-scale';
import type { EmergenceDay } from './emergence-day';
import { type Plot, plotOf } from './plot';
import { AsOfLine, DayAxis } from './plot-parts';
import { niceTop } from './value-scale';

const TOP = 8;
const HEIGHT = 150;
const BASE = TOP + HEIGHT;
const LEFT = 34;

interface DayBarProps {
  day: EmergenceDay;
  plot: Plot;
  y: (value: number) => number;
}

const tenth = (value: number): number => Math.round(value * 10) / 10;

/** One day: a bar to the expected number, before a band over its range. */
function DayBar({ day: { date, expected, lo80, hi80 }, plot, y }: DayBarProps): ReactElement {
  const pitch = (plot.width - plot.left) / plot.scale.days;
  const middle = plot.x(date);
  const [left, right] = [tenth(middle - pitch / 2), tenth(middle + pitch / 2)];
  return (
    <g>
      <rect x={left} width={tenth(pitch)} y={y(hi80)} height={tenth(y(lo80) - y(hi80))} fill="var(--main-wash)" />
      <line x1={left} x2={right} y1={y(hi80)} y2={y(hi80)} stroke="var(--main)" strokeWidth="2.5" />
      <rect
        x={tenth(middle - pitch * 0.3)}
        width={tenth(pitch * 0.6)}
        y={y(expected)}
        height={tenth(BASE - y(expected))}
        fill="var(--fig-capped)"
        stroke="var(--ink)"
        strokeWidth="0.5"
      />
      {lo80 > 0 && <line x1={left} x2={right} y1={y(lo80)} y2={y(lo80)} stroke="var(--main)" strokeWidth="2.5" />}
    </g>
  );
}

function ValueAxis({ top, width, y }: { top: number; width: number; y: (value: number) => number }): ReactElement {
  const values = top <= 1 ? [0, 1] : [0, top / 2, top];
  return (
    <g>
      {values.map((value) => (
        <g key={value}>
          <line x1={LEFT} x2={width} y1={y(value)} y2={y(value)} stroke="var(--rule)" strokeWidth="1" />
          <text className="fig-mono" x={LEFT - 6} y={y(value) + 4} textAnchor="end" fontSize="13" fill="var(--ink)">
            {value}
          </text>
        </g>
      ))}
    </g>
  );
}

interface EmergenceDrawingProps {
  days: readonly EmergenceDay[];
  asOf: string;
  width: number;
}

/** Adults expected per day, each day with the range that holds 8 times in 10; nothing without days. */
export function EmergenceDrawing({ days, asOf, width }: EmergenceDrawingProps): ReactElement | null {
  const scale = dayScale(
    days.map((day) => day.date),
    1,
  );
  if (!scale) return null;
  const plot = plotOf(scale, width, LEFT);
  const top = niceTop(Math.max(...days.map((day) => Math.max(day.expected, day.hi80))));
  const y = (value: number): number => tenth(BASE - (HEIGHT * value) / top);
  const height = BASE + 40;
  return (
    <svg className="fig-svg" width={width} height={height} viewBox={`0 0 ${width} ${height}`}>
      <ValueAxis top={top} width={width} y={y} />
      <DayAxis plot={plot} y={BASE + 18} from={TOP} to={BASE} />
      {days.map((day) => (
        <DayBar key={day.date} day={day} plot={plot} y={y} />
      ))}
      <path d={`M${LEFT} ${TOP}V${BASE}H${width}`} fill="none" stroke="var(--ink)" strokeWidth="2" />
      <AsOfLine plot={plot} asOf={asOf} from={TOP} to={BASE + 22} />
    </svg>
  );
}
