import type { FilledRange, HeatWarning, TemperatureCurve } from './clock-parts';
import { developmentRate, summedRate } from './development-rate';
import type { TemperatureRecord } from './record';
import { type NestPlace, temperatureCurve } from './temperature-curve';
import type { TemperatureSettings } from './temperature-settings';

const HOUR_MS = 3_600_000;
/** Each hour is the mean of the rate in the middle of so many equal pieces. */
const PIECES = 6;

/** How fast brood developed in every hour of a nest's record. */
export interface DevelopmentClock {
  kind: 'logger' | 'daily' | 'none';
  /** First and last instant of the record, epoch milliseconds; null without one. */
  from: number | null;
  to: number | null;
  /**
   * From each instant (epoch milliseconds, rising) the rate in days of the durations per day, until the next one. 1
   * before the first and after the last, which says so itself. Empty without a record.
   */
  rates: readonly (readonly [fromMs: number, ratePerDay: number])[];
  filled: readonly FilledRange[];
  warnings: readonly HeatWarning[];
}

/** The clock of a nest nobody measured: calendar days. */
const CALENDAR_CLOCK: DevelopmentClock = {
  kind: 'none',
  from: null,
  to: null,
  rates: [],
  filled: [],
  warnings: [],
};

function hourlyRate(curve: TemperatureCurve, hour: number, settings: TemperatureSettings): number {
  const middles = Array.from({ length: PIECES }, (_, i) => curve.at(hour + ((i + 0.5) * HOUR_MS) / PIECES));
  const rates = middles.map((celsius) => (celsius === null ? 1 : developmentRate(celsius, settings)));
  return summedRate(rates, (rate) => rate);
}

function hourlyRates(curve: TemperatureCurve, settings: TemperatureSettings): [number, number][] {
  const start = Math.floor(curve.from / HOUR_MS) * HOUR_MS;
  const end = Math.ceil(curve.to / HOUR_MS) * HOUR_MS;
  const rates: [number, number][] = [];
  let before = 1;
  for (let hour = start; hour < end; hour += HOUR_MS) {
    const rate = hourlyRate(curve, hour, settings);
    if (rate !== before) rates.push([hour, rate]);
    before = rate;
  }
  if (before !== 1) rates.push([end, 1]);
  return rates;
}

/**
 * Turns a temperature record into the clock that development runs on: hour by hour, relative to the temperature the
 * durations refer to. Where nothing was measured a day counts as a day; short gaps are drawn, and said to be.
 *
 * @param record null when nobody measured.
 * @param settings from `temperatureSettings`.
 * @throws RangeError when the reference temperature does not lie between base and plateau.
 */
export function developmentClock(
  record: TemperatureRecord | null,
  settings: TemperatureSettings,
  place: NestPlace,
): DevelopmentClock {
  const curve = record && temperatureCurve(record, settings, place);
  if (!record || !curve) return CALENDAR_CLOCK;
  return {
    kind: record.kind,
    from: curve.from,
    to: curve.to,
    rates: hourlyRates(curve, settings),
    filled: curve.filled,
    warnings: curve.warnings,
  };
}
