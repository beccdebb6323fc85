/** A hybrid logical clock reading: a time in milliseconds and a counter for events within it. */
export interface Hlc {
  ms: number;
  counter: number;
}

/** Remote readings further ahead than this are not adopted, so one wrong phone cannot drag the others along. */
export const HLC_MAX_AHEAD_MS = 5 * 60_000;

/**
 * The reading for a local event (Kulkarni et al. 2014): never earlier than the wall clock, always after `last`.
 *
 * @param last the previous reading of this device.
 * @param wallMs the wall clock, which may have been set back.
 */
export function tickHlc(last: Hlc, wallMs: number): Hlc {
  if (wallMs > last.ms) return { ms: wallMs, counter: 0 };
  return { ms: last.ms, counter: last.counter + 1 };
}

/**
 * The reading after a remote one was seen (Kulkarni et al. 2014, receive rule).
 * A remote reading more than `HLC_MAX_AHEAD_MS` ahead of the wall clock is ignored.
 */
export function receiveHlc(last: Hlc, remote: Hlc, wallMs: number): Hlc {
  if (remote.ms > wallMs + HLC_MAX_AHEAD_MS) return tickHlc(last, wallMs);
  const ms = Math.max(last.ms, remote.ms, wallMs);
  if (ms === last.ms && ms === remote.ms) return { ms, counter: Math.max(last.counter, remote.counter) + 1 };
  if (ms === last.ms) return { ms, counter: last.counter + 1 };
  if (ms === remote.ms) return { ms, counter: remote.counter + 1 };
  return { ms, counter: 0 };
}

/** Writes a reading as `"<ms>.<counter>"`. */
export function formatHlc({ ms, counter }: Hlc): string {
  return `${ms}.${counter}`;
}

/** Reads `"<ms>.<counter>"`; returns null when the text is anything else. */
export function parseHlc(text: string): Hlc | null {
  const match = /^(\d{1,15})\.(\d{1,9})$/.exec(text);
  return match ? { ms: Number(match[1]), counter: Number(match[2]) } : null;
}

/**
 * Compares two clock texts as two integers each.
 *
 * @returns negative when `a` is earlier, 0 when equal.
 */
export function compareHlc(a: string, b: string): number {
  const [aMs = '0', aCount = '0'] = a.split('.');
  const [bMs = '0', bCount = '0'] = b.split('.');
  return Number(aMs) - Number(bMs) || Number(aCount) - Number(bCount);
}
