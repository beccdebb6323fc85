import { describe, expect, it } from 'vitest';
import { instantOf, isoWithOffset, minutesBetween, minutesLater } from '@/lib/server/demo/build/demo-time';

describe('the times of a story', () => {
  it('become instants with the offset of the team, and are written back with it', () => {
    const ms = instantOf('2026-06-16T05:41', '-04:00');
    expect(ms).toBe(Date.UTC(2026, 5, 16, 9, 41));
    expect(isoWithOffset(ms + 7_120, '-04:00')).toBe('2026-06-16T05:41:07.120-04:00');
    expect(isoWithOffset(ms, '+02:00')).toBe('2026-06-16T11:41:00.000+02:00');
  });

  it('are counted in minutes over midnight', () => {
    expect(minutesBetween('2026-06-10T23:50', '2026-06-11T00:05')).toBe(15);
    expect(minutesBetween('2026-06-10T20:58', '2026-06-10T20:51')).toBe(-7);
    expect(minutesLater('2026-06-10T23:50', 15)).toBe('2026-06-11T00:05');
  });

  it('are refused when they are not times', () => {
    expect(() => instantOf('16 June', '-04:00')).toThrow(RangeError);
  });
});
