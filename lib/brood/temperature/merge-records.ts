import type { DailyExtremes, LoggerReading, TemperatureRecord } from './record';

/**
 * Puts several records of one nest together, in the order they were kept: where two say something about the same
 * moment or day, the later one counts. A logger outranks days noted by hand, which then are not looked at.
 *
 * @returns null when there is nothing.
 */
export function mergeRecords(records: readonly TemperatureRecord[]): TemperatureRecord | null {
  const readings = new Map<number, LoggerReading>();
  const days = new Map<string, DailyExtremes>();
  for (const record of records) {
    if (record.kind === 'logger') for (const reading of record.readings) readings.set(reading.at, reading);
    else for (const day of record.days) days.set(day.date, day);
  }
  if (readings.size > 0) return { kind: 'logger', readings: [...readings.values()].sort((a, b) => a.at - b.at) };
  if (days.size === 0) return null;
  return { kind: 'daily', days: [...days.values()].sort((a, b) => (a.date < b.date ? -1 : 1)) };
}
