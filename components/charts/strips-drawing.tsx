import type { ReactElement } from 'react';
import { STATE_SYMBOLS } from '@/components/comb/comb-symbols';
import type { CellState } from '@/lib/comb/states';
import { dayScale } from './day-scale';
import { labelRoom, type Plot, plotOf } from './plot';
import { AsOfLine, DayAxis, RangeLine } from './plot-parts';
import type { ChartSpread } from './spread';

/** One strip: the brood of a cell, or of several with the same dates. */
export interface BroodStrip {
  key: string;
  /** What stands at its left: `cells 13, 14`. */
  label: string;
  /** The same where there is little room: `13, 14`. */
  short: string;
  state: CellState;
  laid: ChartSpread;
  capped: ChartSpread | null;
  emerges: ChartSpread | null;
}

const ROW = 34;
const HEAD = 22;
const FOOT = 20;
const GLYPH = 20;
const LETTER = 7.2;
/** Labels with less room than this, in pixels, are numbers only. */
const ROOM_FOR_WORDS = 100;

/** Every date a set of strips needs room for. */
function datesOf(strips: readonly BroodStrip[]): string[] {
  return strips.flatMap(({ laid, capped, emerges }) =>
    [laid, capped, emerges].flatMap((spread) => (spread ? [spread.median, ...spread.p95] : [])),
  );
}

/** A label cut to the room it has; all of it is in its title. */
function cut(label: string, room: number): string {
  const most = Math.floor(room / LETTER);
  return label.length <= most ? label : `${label.slice(0, Math.max(1, most - 1))}…`;
}

interface BarProps {
  plot: Plot;
  from: string;
  to: string;
  y: number;
  fill: string;
}

function Bar({ plot, from, to, y, fill }: BarProps): ReactElement {
  const [x, end] = [plot.x(from), plot.x(to)];
  return (
    <rect
      x={x}
      width={Math.max(0, Math.round((end - x) * 10) / 10)}
      y={y}
      height="9"
      fill={fill}
      stroke="var(--ink)"
      strokeWidth="1"
    />
  );
}

/** Egg and larva light, capped dark; the ranges of laying and emergence below the bar, that of capping above it. */
function Strip({ strip, plot, top }: { strip: BroodStrip; plot: Plot; top: number }): ReactElement {
  const { label, short, state, laid, capped, emerges } = strip;
  const room = plot.left - GLYPH - 10;
  const bar = top + 11;
  const closes = capped?.median ?? emerges?.median ?? laid.median;
  return (
    <g>
      <g className={`comb-cell cell-${state}`}>
        <use href={`#${STATE_SYMBOLS[state]}`} x="0" y={top + 5} width={GLYPH} height={GLYPH} />
      </g>
      <text x={GLYPH + 5} y={top + 20} fontSize="13" fill="var(--ink)">
        <title>{label}</title>
        {cut(room < ROOM_FOR_WORDS ? short : label, room)}
      </text>
      <Bar plot={plot} from={laid.median} to={closes} y={bar} fill="var(--stage-small)" />
      {capped && emerges && (
        <Bar plot={plot} from={capped.median} to={emerges.median} y={bar} fill="var(--fig-capped)" />
      )}
      <RangeLine plot={plot} spread={laid} y={top + 25} />
      {capped && <RangeLine plot={plot} spread={capped} y={top + 5} />}
      {emerges && <RangeLine plot={plot} spread={emerges} y={top + 25} stroke="var(--main)" />}
    </g>
  );
}

interface StripsDrawingProps {
  strips: readonly BroodStrip[];
  /** The day the estimate speaks for. */
  asOf: string;
  width: number;
}

/** When each brood was laid, is capped and comes out; nothing without brood. */
export function StripsDrawing({ strips, asOf, width }: StripsDrawingProps): ReactElement | null {
  const scale = dayScale(datesOf(strips));
  if (!scale) return null;
  const plot = plotOf(scale, width, labelRoom(width));
  const bottom = HEAD + strips.length * ROW;
  const height = bottom + FOOT;
  return (
    <svg className="fig-svg" width={width} height={height} viewBox={`0 0 ${width} ${height}`}>
      <DayAxis plot={plot} y={14} from={HEAD} to={bottom} />
      {strips.map((strip, index) => (
        <Strip key={strip.key} strip={strip} plot={plot} top={HEAD + index * ROW} />
      ))}
      <AsOfLine plot={plot} asOf={asOf} from={HEAD} to={bottom} />
    </svg>
  );
}
