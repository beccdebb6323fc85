import { localParts } from '@/lib/kit/local-date';
import { type FilledRange, type HeatWarning, type TemperatureCurve, degreesText } from './clock-parts';
import type { LoggerReading } from './record';
import type { TemperatureSettings } from './temperature-settings';

const HOUR_MS = 3_600_000;
/** A logger that writes less often than this misses the heat of the day. */
const SPARSE_HOURS = 4;
/** Readings this close together never have a gap between them. */
const CLOSE_HOURS = 1.5;

type Pair = readonly [LoggerReading, LoggerReading];

/** Neighbours in time. */
function pairs(readings: readonly LoggerReading[]): Pair[] {
  return readings.slice(1).map((next, i) => [readings[i] as LoggerReading, next]);
}

/** The usual time between two readings, ms; 0 with fewer than two. */
function usualStep(readings: readonly LoggerReading[]): number {
  const steps = pairs(readings)
    .map(([a, b]) => b.at - a.at)
    .sort((a, b) => a - b);
  return steps[Math.floor(steps.length / 2)] ?? 0;
}

/** The stretches in which readings are missing: longer than one and a half usual steps, and than an hour and a half. */
export function loggerGaps(readings: readonly LoggerReading[]): { from: number; to: number }[] {
  const longest = Math.max(1.5 * usualStep(readings), CLOSE_HOURS * HOUR_MS);
  return pairs(readings)
    .filter(([a, b]) => b.at - a.at > longest)
    .map(([a, b]) => ({ from: a.at, to: b.at }));
}

function filledGaps(readings: readonly LoggerReading[], { shortGapHours }: TemperatureSettings): FilledRange[] {
  return loggerGaps(readings).map(({ from, to }) => {
    const isShort = to - from <= shortGapHours * HOUR_MS;
    return { from, to, how: isShort ? 'interpolated' : 'calendar' };
  });
}

/** The runs of neighbouring readings above a limit. */
function hotRuns(readings: readonly LoggerReading[], limit: number): LoggerReading[][] {
  const runs: LoggerReading[][] = [];
  let wasHot = false;
  for (const reading of readings) {
    const isHot = reading.celsius > limit;
    if (isHot && wasHot) runs.at(-1)?.push(reading);
    else if (isHot) runs.push([reading]);
    wasHot = isHot;
  }
  return runs;
}

/** `2026-07-04 14:30`, local. */
function momentText(epochMs: number, zone: string): string {
  const { date, time } = localParts(epochMs, zone);
  return `${date} ${time}`;
}

function heatWarnings(readings: readonly LoggerReading[], limit: number, zone: string): HeatWarning[] {
  return hotRuns(readings, limit).map((run) => {
    const [first, last] = [run[0], run.at(-1)].map((reading) => momentText(reading?.at ?? 0, zone));
    const highest = degreesText(Math.max(...run.map(({ celsius }) => celsius)));
    const when = first === last ? `at ${first}` : `from ${first} to ${last}`;
    return {
      code: 'heat',
      text: `Above ${limit} °C ${when} (highest ${highest}): brood may have suffered; no development is counted.`,
    };
  });
}

function gapWarnings(filled: readonly FilledRange[], zone: string): HeatWarning[] {
  const long = filled.filter(({ how }) => how === 'calendar');
  return long.map(({ from, to }) => ({
    code: 'long-gap',
    text: `Nothing was measured from ${momentText(from, zone)} to ${momentText(to, zone)}: calendar days are counted.`,
  }));
}

/** The last reading at or before an instant, by its place in the list; -1 before the first. */
function placeOf(readings: readonly LoggerReading[], epochMs: number): number {
  let low = 0;
  let high = readings.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((readings[middle]?.at ?? Infinity) <= epochMs) low = middle + 1;
    else high = middle;
  }
  return low - 1;
}

function lineAt([a, b]: Pair, epochMs: number): number {
  const share = (epochMs - a.at) / (b.at - a.at);
  return a.celsius + share * (b.celsius - a.celsius);
}

/** A logger's readings as a line through them; nothing in its long gaps and outside of it. */
export function loggerCurve(
  readings: readonly LoggerReading[],
  settings: TemperatureSettings,
  zone: string,
): TemperatureCurve {
  const filled = filledGaps(readings, settings);
  const unknown = new Set(filled.filter(({ how }) => how === 'calendar').map(({ from }) => from));
  const sparse: HeatWarning[] =
    usualStep(readings) > SPARSE_HOURS * HOUR_MS
      ? [
          {
            code: 'sparse',
            text: `Readings are more than ${SPARSE_HOURS} hours apart: the heat of the day may be missed.`,
          },
        ]
      : [];
  return {
    from: readings[0]?.at ?? 0,
    to: readings.at(-1)?.at ?? 0,
    at(epochMs) {
      const place = placeOf(readings, epochMs);
      const [before, after] = [readings[place], readings[place + 1]];
      if (!before) return null;
      if (!after) return epochMs === before.at ? before.celsius : null;
      return unknown.has(before.at) ? null : lineAt([before, after], epochMs);
    },
    filled,
    warnings: [...heatWarnings(readings, settings.limit, zone), ...gapWarnings(filled, zone), ...sparse],
  };
}
