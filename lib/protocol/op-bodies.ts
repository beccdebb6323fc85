import * as z from 'zod';
import { CELL_STATES } from '@/lib/comb/states';
import { idText as id, nameText as name, placeValue as place, wordsText as words } from './member-types';
import type { OpKind } from './op';

/** What a nest, visit or reading field may be set to; `null` clears it. */
const fieldValue = z.union([z.null(), z.boolean(), z.number(), words, place]);

/** Which entity a register belongs to: a word that points into the envelope, or the entity's id. */
const entity = z.union([z.enum(['nest', 'visit', 'reading']), id]);

/** `base`: the operation the person edited from; null when the field was never set; a list when a conflict is settled. */
const base = z.union([z.null(), id, z.array(id).max(20)]);

/** The body of every kind of operation, version 1. Unknown members are refused. */
export const OP_BODIES = {
  'nest.open': z.strictObject({
    code: name.min(1),
    name: name.nullish(),
    taxon: name.nullish(),
    place: place.nullish(),
  }),
  'visit.open': z.strictObject({ purpose: z.enum(['take-down', 'check', 'lab', 'other']), startedAt: z.string() }),
  'reading.open': z.strictObject({
    kind: z.enum(['field', 'second']),
    source: z.enum(['phone', 'paper', 'photo']),
    aid: name.nullish(),
    light: name.nullish(),
  }),
  'cell.mark': z.strictObject({
    q: z.number(),
    r: z.number(),
    state: z.enum(CELL_STATES),
    nectar: z.boolean(),
    unsure: z.boolean(),
    reused: z.boolean().nullish(),
    scrap: z.boolean().nullish(),
    instar: z.number().int().min(1).max(5).nullish(),
    note: words.nullish(),
    supersedes: id.nullish(),
  }),
  'cell.retract': z.strictObject({ target: id }),
  'reading.submit': z.strictObject({}),
  'field.set': z.strictObject({ entity, field: name.min(1), value: fieldValue, base }),
  'note.set': z.strictObject({ entity, text: words, base }),
  'step.mark': z.strictObject({
    step: name.min(1),
    phase: z.enum(['start', 'stop', 'mark']),
    note: words.nullish(),
  }),
  'behaviour.add': z.strictObject({
    mode: z.enum(['scan', 'all', 'load']),
    behaviour: name.min(1),
    individual: name.nullish(),
    note: words.nullish(),
  }),
  'sting.add': z.strictObject({
    person: name.nullish(),
    bodySite: name.nullish(),
    symptoms: z.array(name).max(40),
    note: words.nullish(),
  }),
  'photo.attach': z.strictObject({
    photoId: id,
    sha256: z.string().regex(/^[0-9a-f]{64}$/),
    bytes: z.number().int().min(0),
    mime: name,
    w: z.number().int().min(0).nullish(),
    h: z.number().int().min(0).nullish(),
    shot: name.nullish(),
    cell: z.strictObject({ q: z.number(), r: z.number() }).nullish(),
  }),
  'photo.detach': z.strictObject({ photoId: id }),
  'entity.archive': z.strictObject({ entity, reason: words.nullish() }),
} satisfies Record<OpKind, z.ZodType>;

/** The parsed body of one kind. */
export type OpBody<K extends OpKind> = z.output<(typeof OP_BODIES)[K]>;
