import { describe, expect, it } from 'vitest';
import { localDate } from '@/lib/kit/local-date';
import { startOfLocalDay } from '@/lib/kit/start-of-local-day';

describe('startOfLocalDay', () => {
  it.each([
    ['2026-06-16', 'America/New_York', '2026-06-16T04:00:00.000Z'],
    ['2026-01-16', 'America/New_York', '2026-01-16T05:00:00.000Z'],
    ['2026-03-08', 'America/New_York', '2026-03-08T05:00:00.000Z'],
    ['2026-03-09', 'America/New_York', '2026-03-09T04:00:00.000Z'],
    ['2026-06-16', 'UTC', '2026-06-16T00:00:00.000Z'],
    ['2026-06-16', 'Pacific/Kiritimati', '2026-06-15T10:00:00.000Z'],
    ['2026-06-16', 'Pacific/Pago_Pago', '2026-06-16T11:00:00.000Z'],
  ])('of %s in %s is %s', (date, zone, instant) => {
    expect(new Date(startOfLocalDay(date, zone)).toISOString()).toBe(instant);
  });

  it('is the end of the gap where clocks skip midnight (tz database: Sao Paulo, 4 November 2018)', () => {
    const start = startOfLocalDay('2018-11-04', 'America/Sao_Paulo');
    expect(new Date(start).toISOString()).toBe('2018-11-04T03:00:00.000Z');
  });

  it('is the first millisecond of the date', () => {
    for (const zone of ['Europe/Copenhagen', 'Australia/Lord_Howe', 'Asia/Kathmandu']) {
      const start = startOfLocalDay('2026-10-04', zone);
      expect([localDate(start - 1, zone), localDate(start, zone)]).toEqual(['2026-10-03', '2026-10-04']);
    }
  });
});
