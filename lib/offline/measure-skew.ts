/**
 * How far the phone's clock is behind the office's, in milliseconds (Cristian 1989): the office's time, plus half the
 * round trip, minus ours. Null when the office's time cannot be read.
 *
 * @param serverTime ISO 8601 UTC from the answer.
 * @param rttMs round trip by the monotonic clock.
 * @param now the phone's clock when the answer came.
 */
export function measureSkew(serverTime: string, rttMs: number, now: number): number | null {
  const office = Date.parse(serverTime);
  return Number.isNaN(office) ? null : Math.round(office + rttMs / 2 - now);
}
