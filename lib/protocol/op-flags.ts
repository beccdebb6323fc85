import type { Json } from './canonical-json';
import { CLOCK_FLAG_MS } from './limits';
import type { Op, OpTime } from './op';
import type { OpFlag } from './op-codes';
import { parseWall } from './wall-time';

const DAY_MS = 86_400_000;

/** A wall time this far back was hardly written by a clock that was right. */
const OLD_MS = 400 * DAY_MS;

/** A place this far from the team's home, yet near it with the coordinates swapped, was typed the wrong way round. */
const FAR_KM = 1_000;
const EARTH_KM = 6_371;

/** Degrees WGS 84. */
interface LatLon {
  lat: number;
  lon: number;
}

function isDoubtfulWall(wall: string, receivedMs: number): boolean {
  const parsed = parseWall(wall);
  if (!parsed.ok || parsed.value.odd) return true;
  const ahead = parsed.value.epochMs - receivedMs;
  return ahead > CLOCK_FLAG_MS || ahead < -OLD_MS;
}

/** Is the phone's clock doubtful: measured wrong, in the future, far in the past, or written oddly? */
export function hasClockFlag(at: OpTime, receivedMs: number): boolean {
  return Math.abs(at.skewMs ?? 0) > CLOCK_FLAG_MS || isDoubtfulWall(at.wall, receivedMs);
}

/** Great-circle distance in kilometres (haversine, sphere). */
function distanceKm(a: LatLon, b: LatLon): number {
  const radians = Math.PI / 180;
  const half = (degrees: number) => Math.sin((degrees * radians) / 2) ** 2;
  const h = half(b.lat - a.lat) + Math.cos(a.lat * radians) * Math.cos(b.lat * radians) * half(b.lon - a.lon);
  return 2 * EARTH_KM * Math.asin(Math.min(1, Math.sqrt(h)));
}

/**
 * Is a place doubtful: exactly 0/0, or latitude and longitude swapped?
 *
 * @param home where the team works; null when unknown, then swapping cannot be told.
 */
export function isDoubtfulPlace(place: LatLon, home: LatLon | null): boolean {
  if (place.lat === 0 && place.lon === 0) return true;
  if (!home || Math.abs(place.lon) > 90) return false;
  const asGiven = distanceKm(home, place);
  return asGiven > FAR_KM && distanceKm(home, { lat: place.lon, lon: place.lat }) < asGiven;
}

/** Reads a checked place value. */
export function placeOf(value: Json | undefined): (LatLon & { accuracyM: number | null }) | null {
  if (value === null || value === undefined || typeof value !== 'object' || Array.isArray(value)) return null;
  const { lat, lon, accuracyM } = value;
  if (typeof lat !== 'number' || typeof lon !== 'number') return null;
  return { lat, lon, accuracyM: typeof accuracyM === 'number' ? accuracyM : null };
}

/**
 * The operations whose monotonic reading is negative, or behind that of the one before in the same boot.
 *
 * @param ops in the order in which the phone made them.
 */
export function opsWithMonoFlag(ops: readonly Pick<Op, 'opId' | 'at'>[]): Set<string> {
  const flagged = new Set<string>();
  const last = new Map<string, number>();
  for (const { opId, at } of ops) {
    if (at.mono < (last.get(at.boot) ?? 0)) flagged.add(opId);
    last.set(at.boot, at.mono);
  }
  return flagged;
}

/** Flags as stored: words separated by commas. */
export function formatFlags(flags: readonly OpFlag[]): string {
  return flags.join(',');
}

/** Reads stored flags. */
export function parseFlags(text: string): string[] {
  return text === '' ? [] : text.split(',');
}
