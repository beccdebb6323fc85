import 'server-only';
import { createHash } from 'node:crypto';
import { bytesToUuid } from '@/lib/kit/uuid';

/** The opening of the season, 2026-04-01 12:00 UTC: the time part of every demo id, so that an id depends on its name alone. */
const SEASON_OPENS_MS = Date.UTC(2026, 3, 1, 12);

function digestOf(name: string): Buffer {
  return createHash('sha256').update(`undereave demo ${name}`, 'utf8').digest();
}

/**
 * The fixed id of something in the demo: equal names give equal ids in every load, so loading again finds what is there.
 *
 * @param name what is named, such as `nest/N12`.
 * @returns a UUIDv7 text (RFC 9562) whose random bits are the name's SHA-256.
 */
export function demoId(name: string): string {
  const bytes = new Uint8Array(digestOf(name).subarray(0, 16));
  const time = new DataView(new ArrayBuffer(8));
  time.setBigUint64(0, BigInt(SEASON_OPENS_MS) << 16n);
  bytes.set(new Uint8Array(time.buffer, 0, 6));
  bytes[6] = ((bytes[6] ?? 0) & 0x0f) | 0x70;
  bytes[8] = ((bytes[8] ?? 0) & 0x3f) | 0x80;
  return bytesToUuid(bytes);
}

/** A seed for `seededRandom`, fixed by a name. */
export function demoSeed(name: string): number {
  return digestOf(name).readUInt32BE(16);
}
