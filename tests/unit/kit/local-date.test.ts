import { describe, expect, it } from 'vitest';
import { addDays, daysBetween, isTimeZone, localDate, localParts } from '@/lib/kit/local-date';

describe('local dates', () => {
  it('are those of the place, not of the machine', () => {
    const lateEvening = Date.parse('2026-06-17T03:30:00Z');
    expect(localDate(lateEvening, 'America/New_York')).toBe('2026-06-16');
    expect(localDate(lateEvening, 'UTC')).toBe('2026-06-17');
    expect(localParts(lateEvening, 'America/New_York')).toEqual({ date: '2026-06-16', time: '23:30' });
  });

  it('write midnight as 00:00', () => {
    expect(localParts(Date.parse('2026-06-16T04:00:00Z'), 'America/New_York').time).toBe('00:00');
  });

  it('count days across a change of clocks and a leap day', () => {
    expect(daysBetween('2026-03-07', '2026-03-09')).toBe(2);
    expect(addDays('2024-02-28', 1)).toBe('2024-02-29');
    expect(addDays('2026-03-01', -1)).toBe('2026-02-28');
    expect(daysBetween('2026-06-16', '2026-06-10')).toBe(-6);
  });

  it('know which zones exist', () => {
    expect(isTimeZone('America/New_York')).toBe(true);
    expect(isTimeZone('Europe/Nowhere')).toBe(false);
  });
});
