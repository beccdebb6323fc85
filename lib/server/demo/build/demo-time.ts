import 'server-only';

/**
 * A wall time as a story tells it, without offset: `2026-06-16T05:35` or with seconds. The team's offset is added when
 * operations are built; the season lies wholly within summer time, so one offset serves a team.
 */
export type WallTime = string;

const WALL_TIME = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}(:\d{2})?$/;

/** The instant of a wall time. @throws RangeError when the text is not a time. */
export function instantOf(wall: WallTime, offset: string): number {
  const ms = WALL_TIME.test(wall) ? Date.parse(`${wall}${offset}`) : Number.NaN;
  if (Number.isNaN(ms)) throw new RangeError(`Not a wall time with offset: ${wall}${offset}`);
  return ms;
}

/** Milliseconds that an offset such as `-04:00` puts local time ahead of UTC. */
function offsetMs(offset: string): number {
  return instantOf('1970-01-01T00:00', 'Z') - instantOf('1970-01-01T00:00', offset);
}

/** ISO 8601 with offset and milliseconds, as a phone writes it: `2026-06-16T05:41:07.120-04:00`. */
export function isoWithOffset(ms: number, offset: string): string {
  return `${new Date(ms + offsetMs(offset)).toISOString().slice(0, -1)}${offset}`;
}

/** Whole minutes from one wall time to another on the same clock; negative when `to` is earlier. */
export function minutesBetween(from: WallTime, to: WallTime): number {
  return Math.round((instantOf(to, 'Z') - instantOf(from, 'Z')) / 60_000);
}

/** A wall time some minutes later on the same clock. */
export function minutesLater(wall: WallTime, minutes: number): WallTime {
  return new Date(instantOf(wall, 'Z') + minutes * 60_000).toISOString().slice(0, 16);
}
