import { describe, expect, it } from 'vitest';
import { estimateDay } from '@/components/lab/estimate-day';
import type { NestView, ReadingRow } from '@/components/lab/lab-shapes';
import { shownReading } from '@/components/lab/shown-reading';
import { emptyTally } from '@/lib/comb/tally';

const reading = (id: string, kind: string, tally: ReadingRow['tally'] = emptyTally()): ReadingRow => ({
  id,
  kind,
  observer: 'Senna Vautry',
  openedAt: '2026-06-16T09:35:00Z',
  submittedAt: null,
  lockedVersion: null,
  tally,
});

const nest = (early: ReadingRow[], late: ReadingRow[]): NestView => ({
  id: 'n',
  code: 'N12',
  name: null,
  taxon: null,
  place: null,
  visits: [
    { id: 'v2', purpose: 'check', startedAt: '2026-06-23T10:00:00-04:00', readings: late },
    { id: 'v1', purpose: 'take-down', startedAt: '2026-06-16T05:35:00-04:00', readings: early },
  ],
});

describe('the reading a nest page shows', () => {
  it('is the final one of the latest visit that was read', () => {
    const shown = shownReading(
      nest([reading('s', 'second'), reading('f', 'field'), reading('x', 'final')], []),
      undefined,
    );
    expect(shown?.reading.id).toBe('x');
  });

  it('is of the latest visit first, then by kind', () => {
    expect(shownReading(nest([reading('x', 'final')], [reading('f', 'field')]), undefined)?.reading.id).toBe('f');
  });

  it('is the one asked for when it is there', () => {
    const both = nest([reading('f', 'field'), reading('x', 'final')], []);
    expect(shownReading(both, 'f')?.reading.id).toBe('f');
    expect(shownReading(both, 'another')?.reading.id).toBe('x');
  });

  it('is never one the reader must stay blind to', () => {
    expect(shownReading(nest([reading('f', 'field', null)], []), 'f')).toBeNull();
  });
});

describe('the day an estimate speaks for', () => {
  const zone = 'America/New_York';
  const visitAt = Date.parse('2026-06-17T03:00:00Z');
  const later = (days: number) => visitAt + days * 86_400_000;

  it('is today while the latest reading is fresh', () => {
    expect(estimateDay({ visitAt, chosen: false, nowMs: later(10), zone })).toBe('2026-06-26');
  });

  it('is the local day of a reading the reader chose', () => {
    expect(estimateDay({ visitAt, chosen: true, nowMs: later(10), zone })).toBe('2026-06-16');
  });

  it('is the day of the last reading once forecasts no longer reach today', () => {
    expect(estimateDay({ visitAt, chosen: false, nowMs: later(60), zone })).toBe('2026-08-15');
    expect(estimateDay({ visitAt, chosen: false, nowMs: later(61), zone })).toBe('2026-06-16');
  });

  it('is today for a nest nobody has read', () => {
    expect(estimateDay({ visitAt: null, chosen: false, nowMs: later(0), zone })).toBe('2026-06-16');
  });
});
