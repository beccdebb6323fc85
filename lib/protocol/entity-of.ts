import type { Json } from './canonical-json';

/** What can carry registers and be archived. */
export const ENTITY_TYPES = ['nest', 'visit', 'reading'] as const;

/** One of `ENTITY_TYPES`. */
export type EntityType = (typeof ENTITY_TYPES)[number];

/** An entity by type and id. */
export interface EntityRef {
  type: EntityType;
  id: string;
}

/** The part of an operation that says which entity it is about. */
interface AboutEntity {
  nest: string | null;
  visit: string | null;
  reading: string | null;
  body: { [key: string]: Json };
}

/**
 * The entity that `body.entity` means: a word that points into the envelope, or an id that the envelope names.
 * Null when the envelope does not name it.
 */
export function entityOf(op: AboutEntity): EntityRef | null {
  const { entity } = op.body;
  for (const type of ENTITY_TYPES) {
    const id = op[type];
    if (id !== null && (entity === type || entity === id)) return { type, id };
  }
  return null;
}
