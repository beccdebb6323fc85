import type { TemperatureCurve } from './clock-parts';
import { dailyCurve } from './daily-curve';
import { loggerCurve } from './logger-curve';
import type { TemperatureRecord } from './record';
import type { Place } from './sun-times';
import type { TemperatureSettings } from './temperature-settings';

/** Where the nest hangs and what its clocks show. */
export interface NestPlace {
  /** IANA zone. */
  zone: string;
  place: Place | null;
}

/**
 * A record as temperature over time: the logger's line, or the hours drawn through daily extremes.
 *
 * @param record its readings or days in the order of time, each time once.
 * @returns null for a record without a single value.
 */
export function temperatureCurve(
  record: TemperatureRecord,
  settings: TemperatureSettings,
  { zone, place }: NestPlace,
): TemperatureCurve | null {
  if (record.kind === 'logger') {
    return record.readings.length === 0 ? null : loggerCurve(record.readings, settings, zone);
  }
  return record.days.length === 0 ? null : dailyCurve(record.days, settings, { zone, place });
}
