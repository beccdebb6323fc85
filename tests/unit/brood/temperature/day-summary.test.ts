import { describe, expect, it } from 'vitest';
import { DEFAULT_SETTINGS } from '@/lib/brood/settings';
import { decodeText } from '@/lib/brood/temperature/csv/decode-text';
import { daySummaries } from '@/lib/brood/temperature/day-summary';
import { developmentClock } from '@/lib/brood/temperature/development-clock';
import { mergeRecords } from '@/lib/brood/temperature/merge-records';
import type { TemperatureRecord } from '@/lib/brood/temperature/record';
import { temperatureSettings } from '@/lib/brood/temperature/temperature-settings';

const HOUR = 3_600_000;
/** Midnight of 1 June in New York. */
const START = Date.parse('2026-06-01T04:00:00Z');
const ZONE = 'America/New_York';

/** Hourly readings from the first to the last hour, all of one temperature. */
function hours(from: number, to: number, celsius: number): TemperatureRecord {
  const readings = Array.from({ length: to - from + 1 }, (_, i) => ({ at: START + (from + i) * HOUR, celsius }));
  return { kind: 'logger', readings };
}

function days(record: TemperatureRecord) {
  const settings = temperatureSettings(DEFAULT_SETTINGS.values, 25);
  return daySummaries(record, developmentClock(record, settings, { zone: ZONE, place: null }), ZONE);
}

describe('a record day by day', () => {
  it('has lowest, highest and what the day counts for, in days of the durations', () => {
    const [first, second] = days(hours(0, 48, 17.5));
    expect(first).toMatchObject({ date: '2026-06-01', min: 17.5, max: 17.5, drawnHours: 0, calendarHours: 0 });
    expect(first?.development).toBeCloseTo(0.5, 12);
    expect(second?.development).toBeCloseTo(0.5, 12);
  });

  it('says how many hours were filled and how many count as calendar time', () => {
    const both = mergeRecords([hours(6, 10, 25), hours(13, 20, 25)]);
    const [day] = both ? days(both) : [];
    // A gap from 10 to 13 h is drawn; 0 to 6 and 20 to 24 h lie outside the record.
    expect(day).toMatchObject({ drawnHours: 3, calendarHours: 10, development: expect.closeTo(1, 12) });
  });
});

describe('several records of one nest', () => {
  it('count together, the later one where both speak, and a logger before days by hand', () => {
    const hand: TemperatureRecord = { kind: 'daily', days: [{ date: '2026-06-01', min: 10, max: 20 }] };
    expect(mergeRecords([hand, hours(0, 2, 20), hours(2, 3, 30)])).toEqual({
      kind: 'logger',
      readings: [20, 20, 30, 30].map((celsius, i) => ({ at: START + i * HOUR, celsius })),
    });
    expect(mergeRecords([hand])).toEqual(hand);
    expect(mergeRecords([])).toBeNull();
  });
});

describe('the bytes of a file', () => {
  it.each([
    ['UTF-8 with a mark', [0xef, 0xbb, 0xbf, 0xc2, 0xb0, 0x43], '°C'],
    ['the western code page', [0xb0, 0x43], '°C'],
    ['UTF-16, low byte first', [0xff, 0xfe, 0xb0, 0x00, 0x43, 0x00], '°C'],
    ['UTF-16, high byte first', [0xfe, 0xff, 0x00, 0xb0, 0x00, 0x43], '°C'],
  ])('are read as %s', (_name, bytes, text) => {
    expect(decodeText(new Uint8Array(bytes))).toBe(text);
  });
});
