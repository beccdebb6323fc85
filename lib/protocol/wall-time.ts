import { isTimeZone } from '@/lib/kit/local-date';
import { type Result, err, ok } from '@/lib/kit/result';

/** A wall time as an instant. */
export interface WallTime {
  /** Epoch milliseconds; without an offset the text is read as UTC. */
  epochMs: number;
  /** Something about the text itself is odd: no offset, 24:00, a leap second, a year outside 1990–2200. */
  odd: boolean;
}

/** Longer texts are no wall time. */
const MAX_LENGTH = 100;

/** Furthest offset in use anywhere, in minutes: UTC+14. */
const MAX_OFFSET_MINUTES = 14 * 60;

const DATE_TIME = /^(\d{4})-(\d\d)-(\d\d)(?:T(\d\d):(\d\d)(?::(\d\d)(?:\.(\d{1,9}))?)?)?/;
const OFFSET_AND_ZONE = /^(Z|[+-]\d\d:\d\d)?(?:\[([A-Za-z0-9_+\-/]+)\])?$/;

/** Minutes east of UTC; null when no such offset is in use. */
function offsetMinutes(text: string): number | null {
  if (text === 'Z') return 0;
  const [hours, minutes] = [Number(text.slice(1, 3)), Number(text.slice(4, 6))];
  const total = hours * 60 + minutes;
  if (minutes > 59 || total > MAX_OFFSET_MINUTES) return null;
  return text.startsWith('-') ? -total : total;
}

/** The epoch milliseconds of a UTC time; also for years before 100, which `Date.UTC` would move to the 1900s. */
function utcMs(year: number, month: number, day: number): number {
  return new Date(0).setUTCFullYear(year, month - 1, day);
}

function isDate(year: number, month: number, day: number): boolean {
  if (month < 1 || month > 12 || day < 1) return false;
  return new Date(utcMs(year, month, day)).getUTCDate() === day && day <= 31;
}

function isTimeOfDay(hour: number, minute: number, second: number): boolean {
  if (hour === 24) return minute === 0 && second === 0;
  return hour < 24 && minute < 60 && second <= 60;
}

/**
 * Reads an ISO 8601 time, with an optional zone name in brackets (RFC 9557).
 *
 * @returns the instant; or `time` for no such date or time, `tz` for no such offset or zone.
 */
export function parseWall(text: string): Result<WallTime, 'time' | 'tz'> {
  const match = text.length <= MAX_LENGTH ? DATE_TIME.exec(text) : null;
  if (!match) return err('time');
  const [year = 0, month = 0, day = 0, hour = 0, minute = 0, second = 0] = match
    .slice(1, 7)
    .map((part) => Number(part ?? 0));
  if (!isDate(year, month, day) || !isTimeOfDay(hour, minute, second)) return err('time');
  const zone = OFFSET_AND_ZONE.exec(text.slice(match[0].length));
  const offset = zone?.[1] === undefined ? 0 : offsetMinutes(zone[1]);
  if (!zone || offset === null || (zone[2] !== undefined && !isTimeZone(zone[2]))) return err('tz');
  const fraction = Number(`0.${match[7] ?? '0'}`);
  const seconds = hour * 3600 + (minute - offset) * 60 + second + fraction;
  const odd = zone[1] === undefined || hour === 24 || second === 60 || year < 1990 || year > 2200;
  return ok({ epochMs: utcMs(year, month, day) + Math.floor(seconds * 1000 + 1e-6), odd });
}
