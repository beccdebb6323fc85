import * as z from 'zod';
import type { Json } from './canonical-json';
import type { EntityType } from './entity-of';
import { nameText, placeValue } from './member-types';
import type { OpCode } from './op-codes';
import { parseWall } from './wall-time';

const wallText = z.string().refine((text) => parseWall(text).ok);

/** The fields with a meaning of their own. Other fields are kept as they come, for a later version to read. */
const ENTITY_FIELDS = {
  nest: { code: nameText.min(1), name: nameText.nullable(), taxon: nameText.nullable(), place: placeValue.nullable() },
  visit: { purpose: z.enum(['take-down', 'check', 'lab', 'other']), startedAt: wallText },
  reading: { aid: nameText.nullable(), light: nameText.nullable() },
} as const satisfies Record<EntityType, Record<string, z.ZodType>>;

/** The schema of a field; null for one that has no meaning here. */
export function fieldSchema(type: EntityType, field: string): z.ZodType | null {
  const fields: Record<string, z.ZodType> = ENTITY_FIELDS[type];
  return Object.hasOwn(fields, field) ? (fields[field] ?? null) : null;
}

/** Checks a value against its field: `place`, `too-long` or `value` when it does not fit. */
export function checkFieldValue(type: EntityType, field: string, value: Json): OpCode | null {
  const parsed = fieldSchema(type, field)?.safeParse(value);
  if (!parsed || parsed.success) return null;
  if (field === 'place') return 'place';
  return parsed.error.issues.some((issue) => issue.message === 'too-long') ? 'too-long' : 'value';
}
