import { addDays, daysBetween } from '@/lib/kit/local-date';
import { startOfLocalDay } from '@/lib/kit/start-of-local-day';
import { type FilledRange, type HeatWarning, type TemperatureCurve, degreesText } from './clock-parts';
import { linvill, partonLogan } from './hourly-curves';
import type { DailyExtremes } from './record';
import { type Place, sunTimes } from './sun-times';
import type { TemperatureSettings } from './temperature-settings';

const HOUR_MS = 3_600_000;

/** Where and when the days are. */
interface DayFrame {
  zone: string;
  place: Place | null;
}

/** One day of a run without gaps, from its sunrise on. */
interface SunDay {
  sunrise: number;
  dayLength: number;
  min: number;
  max: number;
  nextMin: number;
}

/** Days in a row with no gap, and the instants of their first and last midnight. */
interface DayRun {
  from: number;
  to: number;
  days: readonly SunDay[];
}

/** Sunrise and day length; 06:00 and twelve hours where place or sun give none. */
function sunOf(date: string, { zone, place }: DayFrame): { sunrise: number; dayLength: number; isReal: boolean } {
  const sun = place && sunTimes(date, place);
  if (sun?.sunrise != null && sun.sunset !== null) {
    return { sunrise: sun.sunrise, dayLength: (sun.sunset - sun.sunrise) / HOUR_MS, isReal: true };
  }
  return { sunrise: startOfLocalDay(date, zone) + 6 * HOUR_MS, dayLength: 12, isReal: false };
}

/** The days between two neighbours that are missing, drawn on a line. */
function daysBetweenDrawn(before: DailyExtremes, after: DailyExtremes): DailyExtremes[] {
  const steps = daysBetween(before.date, after.date);
  return Array.from({ length: steps - 1 }, (_, i) => {
    const share = (i + 1) / steps;
    return {
      date: addDays(before.date, i + 1),
      min: before.min + share * (after.min - before.min),
      max: before.max + share * (after.max - before.max),
    };
  });
}

/** Splits days where too many are missing and fills the rest. */
function splitRuns(days: readonly DailyExtremes[], shortGapDays: number): DailyExtremes[][] {
  const runs: DailyExtremes[][] = [];
  for (const day of days) {
    const run = runs.at(-1);
    const last = run?.at(-1);
    if (run && last && daysBetween(last.date, day.date) - 1 <= shortGapDays)
      run.push(...daysBetweenDrawn(last, day), day);
    else runs.push([day]);
  }
  return runs;
}

/** A run with the night before its first day, which borrows that day's extremes, and the one after its last. */
function withSun(days: readonly DailyExtremes[], frame: DayFrame): DayRun {
  const [first, last] = [days[0], days.at(-1)] as [DailyExtremes, DailyExtremes];
  const whole = [{ ...first, date: addDays(first.date, -1) }, ...days];
  return {
    from: startOfLocalDay(first.date, frame.zone),
    to: startOfLocalDay(addDays(last.date, 1), frame.zone),
    days: whole.map(({ date, min, max }, i) => {
      const { sunrise, dayLength } = sunOf(date, frame);
      return { sunrise, dayLength, min, max, nextMin: whole[i + 1]?.min ?? min };
    }),
  };
}

/** The missing days between two days, as a stretch of time; null when there are none. */
function gapBetween(
  [before, after]: readonly [DailyExtremes, DailyExtremes],
  shortGapDays: number,
  zone: string,
): FilledRange | null {
  const missing = daysBetween(before.date, after.date) - 1;
  if (missing < 1) return null;
  return {
    from: startOfLocalDay(addDays(before.date, 1), zone),
    to: startOfLocalDay(after.date, zone),
    how: missing <= shortGapDays ? 'interpolated' : 'calendar',
  };
}

function longGapWarnings(days: readonly DailyExtremes[], shortGapDays: number): HeatWarning[] {
  return days.slice(1).flatMap((after, i) => {
    const before = days[i] as DailyExtremes;
    const missing = daysBetween(before.date, after.date) - 1;
    if (missing <= shortGapDays) return [];
    const range = `from ${addDays(before.date, 1)} to ${addDays(after.date, -1)}`;
    return [{ code: 'long-gap' as const, text: `Nothing was noted ${range}: calendar days are counted.` }];
  });
}

function hotDays(days: readonly DailyExtremes[], limit: number): HeatWarning[] {
  return days
    .filter(({ max }) => max > limit)
    .map(({ date, max }) => ({
      code: 'heat',
      text: `Above ${limit} °C on ${date} (highest ${degreesText(max)}): brood may have suffered; no development is counted while it lasted.`,
    }));
}

function sunWarnings(days: readonly DailyExtremes[], frame: DayFrame): HeatWarning[] {
  if (!frame.place)
    return [
      { code: 'no-place', text: 'No place is known: sunrise is taken at 06:00 and the day as twelve hours long.' },
    ];
  return days.every(({ date }) => sunOf(date, frame).isReal)
    ? []
    : [
        {
          code: 'no-sun',
          text: 'The sun does not rise and set there on every day: twelve hours of light are assumed.',
        },
      ];
}

/** The day of a run whose sunrise came last. */
function dayAt({ days }: DayRun, epochMs: number): SunDay | undefined {
  return days.findLast(({ sunrise }) => sunrise <= epochMs);
}

/** Daily extremes as a curve through the hours; nothing on days missing in numbers and outside of it. */
export function dailyCurve(
  days: readonly DailyExtremes[],
  settings: TemperatureSettings,
  frame: DayFrame,
): TemperatureCurve {
  const { shortGapDays, limit } = settings;
  const curve = settings.curve === 'linvill' ? linvill : partonLogan;
  const runs = splitRuns(days, shortGapDays).map((run) => withSun(run, frame));
  const gaps = days.slice(1).map((after, i) => gapBetween([days[i] as DailyExtremes, after], shortGapDays, frame.zone));
  return {
    from: runs[0]?.from ?? 0,
    to: runs.at(-1)?.to ?? 0,
    at(epochMs) {
      const run = runs.find(({ from, to }) => from <= epochMs && epochMs < to);
      const day = run && dayAt(run, epochMs);
      return day ? curve(day, (epochMs - day.sunrise) / HOUR_MS) : null;
    },
    filled: gaps.filter((gap) => gap !== null),
    warnings: [...hotDays(days, limit), ...longGapWarnings(days, shortGapDays), ...sunWarnings(days, frame)],
  };
}
