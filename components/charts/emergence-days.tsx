import type { ReactElement } from 'react';
import { dateWords } from '@/components/ui/date-words';
import { dayScale, type DayScale, percentOf } from './day-scale';
import type { EmergenceDay } from './emergence-day';
import { TimeAxis, TimeGrid } from './time-axis';
import { niceTop } from './value-scale';

const HEIGHT = 120;

interface DayBarProps {
  day: EmergenceDay;
  scale: DayScale;
  top: number;
}

const rounded = (percent: number): string => `${Math.round(percent * 100) / 100}%`;

/** One day: a bar to the expected number, before a band over its range. */
function DayBar({ day: { date, expected, lo80, hi80 }, scale, top }: DayBarProps): ReactElement {
  const width = 100 / scale.days;
  const middle = percentOf(scale, date);
  const y = (value: number): number => HEIGHT - (HEIGHT * value) / top;
  const [left, right] = [rounded(middle - width / 2), rounded(middle + width / 2)];
  return (
    <g>
      <rect x={left} width={rounded(width)} y={y(hi80)} height={y(lo80) - y(hi80)} fill="var(--main-wash)" />
      <line x1={left} x2={right} y1={y(hi80)} y2={y(hi80)} stroke="var(--main)" strokeWidth="2.5" />
      <rect
        x={rounded(middle - width * 0.3)}
        width={rounded(width * 0.6)}
        y={y(expected)}
        height={HEIGHT - y(expected)}
        fill="var(--stage-capped)"
        stroke="var(--ink)"
        strokeWidth="0.5"
      />
      {lo80 > 0 && <line x1={left} x2={right} y1={y(lo80)} y2={y(lo80)} stroke="var(--main)" strokeWidth="2.5" />}
    </g>
  );
}

/** The days worth drawing: from the first to the last on which anything at all is expected. */
export function busyDays(days: readonly EmergenceDay[]): EmergenceDay[] {
  const isBusy = (day: EmergenceDay): boolean => day.expected >= 0.005 || day.hi80 > 0;
  const [first, last] = [days.findIndex(isBusy), days.findLastIndex(isBusy)];
  return first === -1 ? [] : days.slice(first, last + 1);
}

/** The words that stand for the chart: when most adults are expected, and how many in all. */
export function emergenceWords(days: readonly EmergenceDay[]): string {
  const busiest = days.reduce((best, day) => (day.expected > best.expected ? day : best));
  const total = days.reduce((sum, day) => sum + day.expected, 0);
  return `About ${Math.round(total)} adults are expected in the days shown, most around ${dateWords(busiest.date)}.`;
}

/** Adults expected per day, each with its range. */
export function EmergenceDays({ days }: { days: readonly EmergenceDay[] }): ReactElement | null {
  const scale = dayScale(
    days.map((day) => day.date),
    1,
  );
  if (!scale) return null;
  const top = niceTop(Math.max(...days.map((day) => Math.max(day.expected, day.hi80))));
  return (
    <div className="grid grid-cols-[2rem_minmax(0,1fr)] gap-x-2" role="img" aria-label={emergenceWords(days)}>
      <div className="flex flex-col justify-between text-right font-mono text-sm leading-none">
        <span>{top}</span>
        <span>0</span>
      </div>
      <svg width="100%" height={HEIGHT} className="block border-b-2 border-l-2 border-ink">
        <TimeGrid scale={scale} height={HEIGHT} />
        {days.map((day) => (
          <DayBar key={day.date} day={day} scale={scale} top={top} />
        ))}
      </svg>
      <span />
      <TimeAxis scale={scale} />
    </div>
  );
}
