import 'server-only';
import { bytesToUuid, uuidToBytes } from '@/lib/kit/uuid';

/** The 16 bytes MariaDB stores for a UUID text. */
export function toBinary(uuid: string): Buffer {
  return Buffer.from(uuidToBytes(uuid));
}

/** The 16 bytes of a UUID text, or null for null. */
export function toBinaryOrNull(uuid: string | null | undefined): Buffer | null {
  return uuid ? toBinary(uuid) : null;
}

/** The UUID text of a stored value. */
export function fromBinary(bytes: Buffer): string {
  return bytesToUuid(bytes);
}

/** The UUID text of a stored value, or null for null. */
export function fromBinaryOrNull(bytes: Buffer | null): string | null {
  return bytes ? bytesToUuid(bytes) : null;
}
