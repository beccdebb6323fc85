import { type WrittenDate, writtenDate } from './date-text';

/** A moment as written: a date, a time of day and, where it is there, the distance from UTC. */
export interface WrittenMoment {
  date: WrittenDate;
  /** Milliseconds since midnight; null for a date alone. */
  timeMs: number | null;
  /** Minutes east of UTC; null for local time. */
  offsetMinutes: number | null;
}

const TIME = /(\d{1,2}):(\d{2})(?::(\d{2})(?:[.,](\d{1,9}))?)?\s*([ap]\.?m\.?)?\s*(z|utc|gmt|[+-]\d{2}:?\d{2})?$/i;

/** Hour of day from a clock of twelve or twenty-four hours; null when it has no such hour. */
function hourOfDay(hour: number, half: string | undefined): number | null {
  if (half === undefined) return hour <= 23 ? hour : null;
  if (hour < 1 || hour > 12) return null;
  return (hour % 12) + (half.toLowerCase().startsWith('p') ? 12 : 0);
}

/** Minutes east of UTC of `Z`, `+0200` or `-04:00`. */
export function offsetOf(text: string | undefined): number | null {
  if (text === undefined) return null;
  const match = /^([+-])(\d{1,2}):?(\d{2})?$/.exec(text);
  if (!match) return 0;
  const minutes = Number(match[2]) * 60 + Number(match[3] ?? 0);
  return match[1] === '-' ? -minutes : minutes;
}

function timeOfDay([, hour, minute, second = '0', fraction = '', half]: RegExpExecArray): number | null {
  const hours = hourOfDay(Number(hour), half);
  if (hours === null || Number(minute) > 59 || Number(second) > 59) return null;
  const thousandths = Number(fraction.slice(0, 3).padEnd(3, '0'));
  return ((hours * 60 + Number(minute)) * 60 + Number(second)) * 1000 + thousandths;
}

/** Reads a date with or without a time of day; null for anything else. */
export function writtenMoment(text: string): WrittenMoment | null {
  const time = TIME.exec(text);
  if (!time) {
    const date = writtenDate(text.trim());
    return date && { date, timeMs: null, offsetMinutes: null };
  }
  const date = writtenDate(text.slice(0, time.index).replace(/[T,\s]+$/i, ''));
  const timeMs = timeOfDay(time);
  return date && timeMs !== null ? { date, timeMs, offsetMinutes: offsetOf(time[6]) } : null;
}

/** Is this a time of day alone, such as `05:41` or `5:41 PM`? */
export function isTimeOfDay(text: string): boolean {
  const match = TIME.exec(text);
  return match !== null && match.index === 0 && timeOfDay(match) !== null;
}
