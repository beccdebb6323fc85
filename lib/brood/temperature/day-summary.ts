import { addDays, localDate } from '@/lib/kit/local-date';
import { startOfLocalDay } from '@/lib/kit/start-of-local-day';
import type { FilledRange } from './clock-parts';
import type { DevelopmentClock } from './development-clock';
import type { TemperatureRecord } from './record';

const HOUR_MS = 3_600_000;

/** One local day of a record, as a chart shows it. */
export interface DaySummary {
  /** `YYYY-MM-DD`. */
  date: string;
  /** Lowest and highest that was measured or noted, °C; null when nothing was. */
  min: number | null;
  max: number | null;
  /** Hours of the day that were drawn between neighbours, and that counted as calendar time. */
  drawnHours: number;
  calendarHours: number;
  /** Days of the durations that the day counts for. */
  development: number;
}

interface Extremes {
  min: number;
  max: number;
}

/** What was measured, by local date. */
function measuredByDate(record: TemperatureRecord, zone: string): Map<string, Extremes> {
  if (record.kind === 'daily') return new Map(record.days.map(({ date, min, max }) => [date, { min, max }]));
  const byDate = new Map<string, Extremes>();
  for (const { at, celsius } of record.readings) {
    const date = localDate(at, zone);
    const known = byDate.get(date);
    byDate.set(date, {
      min: Math.min(known?.min ?? celsius, celsius),
      max: Math.max(known?.max ?? celsius, celsius),
    });
  }
  return byDate;
}

/** Hours of a stretch of time that lie in ranges. */
function hoursIn(
  ranges: readonly FilledRange[],
  how: FilledRange['how'],
  [start, end]: readonly [number, number],
): number {
  const own = ranges.filter((range) => range.how === how);
  return own.reduce((sum, { from, to }) => sum + Math.max(0, Math.min(to, end) - Math.max(from, start)), 0) / HOUR_MS;
}

/** The part of a day outside the record, which counts as calendar time. */
function hoursOutside({ from, to }: DevelopmentClock, [start, end]: readonly [number, number]): number {
  return (Math.max(0, (from ?? start) - start) + Math.max(0, end - (to ?? end))) / HOUR_MS;
}

/** The integral of a clock's rates over a stretch of time, days of the durations. */
function developmentIn({ rates }: DevelopmentClock, [start, end]: readonly [number, number]): number {
  let sum = 0;
  let rate = 1;
  let since = start;
  for (const [at, next] of rates) {
    if (at >= end) break;
    if (at > since) {
      sum += (at - since) * rate;
      since = at;
    }
    rate = next;
  }
  return (sum + (end - since) * rate) / (24 * HOUR_MS);
}

/** The days of a record, from the first to the last. */
export function daySummaries(record: TemperatureRecord, clock: DevelopmentClock, zone: string): DaySummary[] {
  if (clock.from === null || clock.to === null) return [];
  const measured = measuredByDate(record, zone);
  const last = localDate(clock.to - 1, zone);
  const days: DaySummary[] = [];
  for (let date = localDate(clock.from, zone); date <= last; date = addDays(date, 1)) {
    const span = [startOfLocalDay(date, zone), startOfLocalDay(addDays(date, 1), zone)] as const;
    days.push({
      date,
      min: measured.get(date)?.min ?? null,
      max: measured.get(date)?.max ?? null,
      drawnHours: hoursIn(clock.filled, 'interpolated', span),
      calendarHours: hoursIn(clock.filled, 'calendar', span) + hoursOutside(clock, span),
      development: developmentIn(clock, span),
    });
  }
  return days;
}
