import type { ReactElement, ReactNode } from 'react';
import { dateWords } from '@/components/ui/date-words';
import { dayScale, type DayScale, isOn, percentOf } from './day-scale';
import { TimeAxis, TimeGrid } from './time-axis';

/** A likeliest day and the range around it, all `YYYY-MM-DD`. */
export interface DatedRange {
  median: string;
  range: readonly [string, string];
}

/** One strip of the chart. */
export interface BroodStrip {
  key: string;
  /** What stands at its left. */
  label: ReactNode;
  laid: DatedRange;
  /** The likeliest day of capping; null when it is not known. */
  capped: string | null;
  emerges: DatedRange | null;
}

const ROW_HEIGHT = 26;

/** Every date a set of strips needs room for. */
function datesOf(strips: readonly BroodStrip[]): string[] {
  return strips.flatMap(({ laid, capped, emerges }) => [
    ...laid.range,
    ...(capped ? [capped] : []),
    ...(emerges ? [emerges.median, ...emerges.range] : []),
  ]);
}

interface SpanProps {
  scale: DayScale;
  from: string;
  to: string;
}

/** A filled stretch between two dates. */
function Bar({ scale, from, to, fill }: SpanProps & { fill: string }): ReactElement {
  const [x, end] = [percentOf(scale, from), percentOf(scale, to)];
  return (
    <rect
      x={`${x}%`}
      width={`${Math.max(0, end - x)}%`}
      y="7"
      height="12"
      fill={fill}
      stroke="var(--ink)"
      strokeWidth="1"
    />
  );
}

/** The range of one date: a line with a stop at each end. */
function Whisker({ scale, from, to, stroke, y }: SpanProps & { stroke: string; y: number }): ReactElement {
  const [x1, x2] = [`${percentOf(scale, from)}%`, `${percentOf(scale, to)}%`];
  return (
    <g stroke={stroke} strokeWidth="2.5">
      <line x1={x1} x2={x2} y1={y} y2={y} />
      <line x1={x1} x2={x1} y1={y - 4} y2={y + 4} />
      <line x1={x2} x2={x2} y1={y - 4} y2={y + 4} />
    </g>
  );
}

/** One strip: laid → capped in a light fill, capped → emerges in the dark one, ranges over and under it. */
function Strip({ strip: { laid, capped, emerges }, scale }: { strip: BroodStrip; scale: DayScale }): ReactElement {
  const lightUntil = capped ?? emerges?.median ?? laid.median;
  return (
    <>
      <Bar scale={scale} from={laid.median} to={lightUntil} fill="var(--stage-small)" />
      {capped && emerges && <Bar scale={scale} from={capped} to={emerges.median} fill="var(--stage-capped)" />}
      <Whisker scale={scale} from={laid.range[0]} to={laid.range[1]} stroke="var(--ink)" y={21} />
      {emerges && <Whisker scale={scale} from={emerges.range[0]} to={emerges.range[1]} stroke="var(--main)" y={5} />}
    </>
  );
}

/** The day the estimate speaks for, across a strip. */
function AsOfLine({ x }: { x: string }): ReactElement {
  return <line x1={x} x2={x} y1="0" y2={ROW_HEIGHT} stroke="var(--ink)" strokeWidth="1.5" strokeDasharray="3 2" />;
}

interface BroodStripsProps {
  strips: readonly BroodStrip[];
  /** The day the estimate speaks for, drawn as an upright line. */
  asOf: string;
}

/** When each cell's brood was laid, is capped and emerges, oldest first. The same dates stand in the table below it. */
export function BroodStrips({ strips, asOf }: BroodStripsProps): ReactElement | null {
  const scale = dayScale(datesOf(strips));
  if (!scale) return null;
  const now = isOn(scale, asOf) ? `${percentOf(scale, asOf)}%` : null;
  return (
    <div
      role="img"
      aria-label={`Brood strips of ${strips.length} groups of cells; the table below holds the same dates.`}
    >
      <div className="brood-row">
        <span />
        <TimeAxis scale={scale} />
      </div>
      {strips.map((strip) => (
        <div key={strip.key} className="brood-row keep-together">
          {strip.label}
          <svg width="100%" height={ROW_HEIGHT} className="block">
            <TimeGrid scale={scale} height={ROW_HEIGHT} />
            <Strip strip={strip} scale={scale} />
            {now && <AsOfLine x={now} />}
          </svg>
        </div>
      ))}
      {now && (
        <div className="brood-row">
          <span />
          <svg width="100%" height="18" className="block overflow-visible">
            <text x={now} y="13" textAnchor="middle" fontSize="13" fill="var(--ink)">
              {dateWords(asOf)}
            </text>
          </svg>
        </div>
      )}
    </div>
  );
}

/** What the parts of a strip mean, in words beside a sample of each. */
export function BroodStripsKey(): ReactElement {
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1 text-sm">
      <li className="flex items-center gap-1.5">
        <svg width="28" height="14" aria-hidden="true">
          <rect x="1" y="1" width="26" height="12" fill="var(--stage-small)" stroke="var(--ink)" />
        </svg>
        egg and larva
      </li>
      <li className="flex items-center gap-1.5">
        <svg width="28" height="14" aria-hidden="true">
          <rect x="1" y="1" width="26" height="12" fill="var(--stage-capped)" stroke="var(--ink)" />
        </svg>
        capped
      </li>
      <li>
        lower line: range of the laying date; upper line: range of the day the adult comes out (8 times in 10). Dashed:
        the day this speaks for.
      </li>
    </ul>
  );
}
