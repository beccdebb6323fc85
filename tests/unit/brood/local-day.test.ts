import { describe, expect, it } from 'vitest';
import { startOfLocalDay } from '@/lib/brood/local-day';

const start = (date: string, zone: string) => new Date(startOfLocalDay(date, zone)).toISOString();

describe('the start of a local day', () => {
  it('is midnight, before and after the clocks change', () => {
    expect(start('2026-06-16', 'America/New_York')).toBe('2026-06-16T04:00:00.000Z');
    expect(start('2026-11-01', 'America/New_York')).toBe('2026-11-01T04:00:00.000Z');
    expect(start('2026-11-02', 'America/New_York')).toBe('2026-11-02T05:00:00.000Z');
    expect(start('2026-03-08', 'America/New_York')).toBe('2026-03-08T05:00:00.000Z');
    expect(start('2026-03-09', 'America/New_York')).toBe('2026-03-09T04:00:00.000Z');
  });

  it('is one o’clock where the clocks skip midnight (Cairo, 24 April 2026)', () => {
    expect(start('2026-04-24', 'Africa/Cairo')).toBe('2026-04-23T22:00:00.000Z');
  });

  it('holds far east, far west and at half-hour offsets', () => {
    expect(start('2026-01-01', 'Pacific/Kiritimati')).toBe('2025-12-31T10:00:00.000Z');
    expect(start('2026-01-01', 'Pacific/Pago_Pago')).toBe('2026-01-01T11:00:00.000Z');
    expect(start('2026-01-01', 'Asia/Kolkata')).toBe('2025-12-31T18:30:00.000Z');
  });
});
