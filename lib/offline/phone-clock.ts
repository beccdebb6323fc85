import type { Clock } from '@/lib/kit/clock';

/** The phone's clocks, and where its wall clock stands. */
export interface PhoneClock extends Clock {
  /** Minutes that local time is ahead of UTC at an instant. */
  offsetMinutes(epochMs: number): number;
}

/** Local wall time with its offset, ISO 8601 with milliseconds: `2026-06-16T05:41:07.120-04:00`. */
export function wallText(clock: PhoneClock, epochMs: number): string {
  const offset = clock.offsetMinutes(epochMs);
  const local = new Date(epochMs + offset * 60_000).toISOString().slice(0, -1);
  const size = Math.abs(offset);
  const two = (value: number) => String(value).padStart(2, '0');
  return `${local}${offset < 0 ? '-' : '+'}${two(Math.floor(size / 60))}:${two(size % 60)}`;
}
