import * as z from 'zod';
import { parseHlc } from '@/lib/kit/hlc';
import { type Result, err, ok } from '@/lib/kit/result';
import { isUuidText } from '@/lib/kit/uuid';
import type { Json } from './canonical-json';
import type { OpCode } from './op-codes';

/** Is this a JSON object, not a list or null? */
function isObject(value: unknown): value is { [key: string]: Json } {
  return value !== null && typeof value === 'object' && !Array.isArray(value);
}

/** A member whose content is judged later has only to be there. */
const present = z.custom<Json>((value) => value !== undefined);

/** Any number; too large ones have become Infinity and are refused by `checkNumbers`. */
const number = z.custom<number>((value) => typeof value === 'number');

const ENVELOPE = z.strictObject({
  v: z.literal(1),
  opId: present,
  kind: z.string(),
  kindV: present,
  deviceId: z.string(),
  n: number,
  nest: z.string().nullable(),
  visit: z.string().nullable(),
  reading: z.string().nullable(),
  at: z.strictObject({ wall: z.string(), mono: number, boot: z.string(), skewMs: number.nullable() }),
  hlc: z.string().refine((text) => parseHlc(text) !== null),
  deps: z.array(z.unknown()),
  body: z.custom<{ [key: string]: Json }>(isObject),
  bodyHash: z.unknown(),
});

/** An operation whose outer form is right; `opId`, `kindV`, `deps` and `bodyHash` may still hold anything. */
export type Envelope = z.output<typeof ENVELOPE>;

/** Is this an operation of a later envelope version, which only a newer server can read? */
export function isNewerEnvelope(value: Json): boolean {
  return isObject(value) && Number.isSafeInteger(value.v) && Number(value.v) > 1;
}

/** Checks members and types: `shape` when one is missing or of a wrong type, `unknown-field` for one too many. */
export function checkEnvelope(value: Json): Result<Envelope, OpCode> {
  const parsed = ENVELOPE.safeParse(value);
  if (parsed.success) return ok(parsed.data);
  return err(parsed.error.issues.every((issue) => issue.code === 'unrecognized_keys') ? 'unknown-field' : 'shape');
}

/** Are all ids of the envelope lower-case UUID text? */
export function hasIds(envelope: Envelope): envelope is Envelope & { opId: string } {
  const { opId, deviceId, nest, visit, reading, at } = envelope;
  return [opId, deviceId, at.boot, nest, visit, reading].every((id) => id === null || isUuidText(id)) && opId !== null;
}
