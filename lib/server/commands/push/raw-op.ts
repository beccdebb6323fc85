import 'server-only';
import { createHash } from 'node:crypto';
import { type Json, canonicalJson } from '@/lib/protocol/canonical-json';
import { checkNumbers } from '@/lib/protocol/check-numbers';

/** One element of a push, before anything is known about it. */
export interface RawOp {
  value: Json;
  /** Its text exactly as it came. */
  raw: string;
}

/** Lower-case hex SHA-256 of UTF-8 text. */
export function sha256Hex(text: string): string {
  return createHash('sha256').update(text).digest('hex');
}

/**
 * Names the content of whatever came, so that sending it again keeps one copy. Spelling does not count where the
 * canonical form can be written, that is, unless a number is out of range.
 */
export function digestOf({ value, raw }: RawOp): string {
  return sha256Hex(checkNumbers(value) === null ? canonicalJson(value) : raw);
}

/** A member of what came, whatever it is; null when there is none. */
export function memberOf(value: Json, name: 'opId' | 'kind' | 'kindV' | 'bodyHash'): Json {
  if (value === null || typeof value !== 'object' || Array.isArray(value)) return null;
  return Object.hasOwn(value, name) ? (value[name] ?? null) : null;
}
