import { daysBetween, localDate } from '@/lib/kit/local-date';

/** Forecasts reach this many days; an older nest is shown as it was known at its last reading. */
const FORECAST_DAYS = 60;

interface EstimateDayInput {
  /** When the visit of the shown reading began, epoch milliseconds; null while there is no reading. */
  visitAt: number | null;
  /** Did the reader choose the reading? Then the estimate says what was known on its day. */
  chosen: boolean;
  nowMs: number;
  zone: string;
}

/**
 * The local day an estimate speaks for: the day of a chosen reading; otherwise today while the latest reading is fresh
 * enough to look ahead from, else the day of that reading.
 */
export function estimateDay({ visitAt, chosen, nowMs, zone }: EstimateDayInput): string {
  const today = localDate(nowMs, zone);
  if (visitAt === null) return today;
  const visitDay = localDate(visitAt, zone);
  return chosen || daysBetween(visitDay, today) > FORECAST_DAYS ? visitDay : today;
}
