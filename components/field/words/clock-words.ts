/** From this difference on a person is told, in milliseconds. */
const CLOCK_OFF_MS = 5 * 60_000;

const MINUTE = 60_000;
const HOUR = 60 * MINUTE;
const DAY = 24 * HOUR;

/** A length of time in its largest fitting unit: `14 minutes`, `3 hours`, `2 days`. */
function lengthWords(ms: number): string {
  const [size, unit] = (
    [
      [DAY, 'day'],
      [HOUR, 'hour'],
      [MINUTE, 'minute'],
    ] as const
  ).find(([least]) => ms >= 2 * least) ?? [MINUTE, 'minute'];
  return `${Math.round(ms / size)} ${unit}s`;
}

/**
 * What is said about a phone's clock, or null while it is near enough.
 *
 * @param skewMs how far the phone is behind the office, in milliseconds; negative when it is ahead.
 */
export function clockWords(skewMs: number | null): string | null {
  if (skewMs === null || Math.abs(skewMs) < CLOCK_OFF_MS) return null;
  return `This phone’s clock is about ${lengthWords(Math.abs(skewMs))} ${skewMs > 0 ? 'slow' : 'fast'}.`;
}
