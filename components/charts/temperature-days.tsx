import type { ReactElement } from 'react';
import { dateWords } from '@/components/ui/date-words';
import type { DaySummary } from '@/lib/brood/temperature/day-summary';
import { dayScale, type DayScale, percentOf } from './day-scale';
import { TimeAxis, TimeGrid } from './time-axis';

const HEIGHT = 150;
const STEP = 10;

/** The part of °C that is drawn: round tens around what was measured. */
interface DegreeScale {
  low: number;
  high: number;
}

interface DayProps {
  day: DaySummary;
  scale: DayScale;
  degrees: DegreeScale;
  limitC: number;
}

const rounded = (percent: number): string => `${Math.round(percent * 100) / 100}%`;

function degreeScale(days: readonly DaySummary[], limitC: number): DegreeScale {
  const values = days.flatMap(({ min, max }) => [min ?? [], max ?? []].flat());
  const top = Math.max(20, ...values);
  return {
    low: Math.floor(Math.min(10, ...values) / STEP) * STEP,
    high: Math.ceil((top > limitC - 5 ? Math.max(top, limitC) : top) / STEP) * STEP,
  };
}

const yOf = ({ low, high }: DegreeScale, celsius: number): number => HEIGHT - (HEIGHT * (celsius - low)) / (high - low);

/** The hours of a day that were not measured, as a band at its foot: hatched when drawn, grey when calendar time. */
function UnmeasuredBand({ day, scale }: Pick<DayProps, 'day' | 'scale'>): ReactElement | null {
  const { drawnHours, calendarHours } = day;
  if (drawnHours + calendarHours < 0.01) return null;
  const width = 100 / scale.days;
  const place = { x: rounded(percentOf(scale, day.date) - width / 2), width: rounded(width) };
  const fill = drawnHours >= calendarHours ? 'url(#drawn-hours)' : 'var(--rule)';
  const share = Math.min(1, (drawnHours + calendarHours) / 24);
  return <rect {...place} y={HEIGHT - HEIGHT * share} height={HEIGHT * share} fill={fill} />;
}

function DayBar({ day, scale, degrees, limitC }: DayProps): ReactElement | null {
  const { date, min, max } = day;
  if (min === null || max === null) return null;
  const width = 100 / scale.days;
  const [top, bottom] = [yOf(degrees, max), yOf(degrees, min)];
  return (
    <rect
      x={rounded(percentOf(scale, date) - width * 0.35)}
      width={rounded(width * 0.7)}
      y={top}
      height={Math.max(2, bottom - top)}
      fill={max > limitC ? 'var(--stop)' : 'var(--main)'}
    />
  );
}

/** Diagonal lines for hours that were drawn between their neighbours. */
function DrawnPattern(): ReactElement {
  return (
    <pattern id="drawn-hours" width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
      <rect width="7" height="7" fill="var(--warn-wash)" />
      <line x1="0" x2="0" y1="0" y2="7" stroke="var(--warn)" strokeWidth="2.5" />
    </pattern>
  );
}

function ScaleLines({ degrees, limitC }: { degrees: DegreeScale; limitC: number }): ReactElement {
  const lines: number[] = [];
  for (let celsius = degrees.low + STEP; celsius < degrees.high; celsius += STEP) lines.push(celsius);
  return (
    <>
      {lines.map((celsius) => (
        <line
          key={celsius}
          x1="0"
          x2="100%"
          y1={yOf(degrees, celsius)}
          y2={yOf(degrees, celsius)}
          stroke="var(--rule)"
        />
      ))}
      {limitC <= degrees.high && (
        <line
          x1="0"
          x2="100%"
          y1={yOf(degrees, limitC)}
          y2={yOf(degrees, limitC)}
          stroke="var(--stop)"
          strokeWidth="1.5"
          strokeDasharray="5 3"
        />
      )}
    </>
  );
}

/** The words that stand for the chart. */
export function temperatureWords(days: readonly DaySummary[], inYear: string): string {
  const [first, last] = [days[0], days.at(-1)];
  if (!first || !last) return '';
  const highest = Math.max(...days.map(({ max }) => max ?? -Infinity));
  const lowest = Math.min(...days.map(({ min }) => min ?? Infinity));
  return (
    `Lowest and highest of each day from ${dateWords(first.date, inYear)} to ${dateWords(last.date, inYear)}: ` +
    `between ${lowest.toFixed(1)} and ${highest.toFixed(1)} °C.`
  );
}

interface TemperatureDaysProps {
  days: readonly DaySummary[];
  limitC: number;
  inYear: string;
}

/** Lowest to highest temperature of each day, and what of the day was not measured. */
export function TemperatureDays({ days, limitC, inYear }: TemperatureDaysProps): ReactElement | null {
  const scale = dayScale(
    days.map(({ date }) => date),
    1,
  );
  if (!scale) return null;
  const degrees = degreeScale(days, limitC);
  return (
    <div className="grid grid-cols-[3rem_minmax(0,1fr)] gap-x-2" role="img" aria-label={temperatureWords(days, inYear)}>
      <div className="flex flex-col justify-between text-right font-mono text-sm leading-none">
        <span>{degrees.high} °C</span>
        <span>{degrees.low} °C</span>
      </div>
      <svg width="100%" height={HEIGHT} className="block border-b-2 border-l-2 border-ink">
        <defs>
          <DrawnPattern />
        </defs>
        {days.map((day) => (
          <UnmeasuredBand key={day.date} day={day} scale={scale} />
        ))}
        <TimeGrid scale={scale} height={HEIGHT} />
        <ScaleLines degrees={degrees} limitC={limitC} />
        {days.map((day) => (
          <DayBar key={day.date} day={day} scale={scale} degrees={degrees} limitC={limitC} />
        ))}
      </svg>
      <span />
      <TimeAxis scale={scale} />
    </div>
  );
}

/** What the parts of the chart mean, in words beside a sample of each. */
export function TemperatureKey({ limitC }: { limitC: number }): ReactElement {
  const samples = [
    { fill: 'var(--main)', words: 'lowest to highest measured' },
    { fill: 'var(--stop)', words: `a day that went above ${limitC} °C` },
    { fill: 'url(#drawn-hours)', words: 'hours filled by a line between their neighbours' },
    { fill: 'var(--rule)', words: 'hours not measured: they count as calendar time' },
  ];
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1 text-sm">
      {samples.map(({ fill, words }) => (
        <li key={words} className="flex items-center gap-1.5">
          <svg width="20" height="14" aria-hidden="true" className="shrink-0">
            <rect x="1" y="1" width="18" height="12" fill={fill} stroke="var(--ink)" />
          </svg>
          {words}
        </li>
      ))}
    </ul>
  );
}
