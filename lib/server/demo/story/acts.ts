import 'server-only';
import type { OpBody } from '@/lib/protocol/op-bodies';
import type { WallTime } from '@/lib/server/demo/build/demo-time';
import type { ActStory } from './nest-story';

/** A step that begins, ends or simply happens. */
export function step(at: WallTime, name: string, note?: string): ActStory {
  return { at, kind: 'step.mark', body: { step: name, phase: 'mark', ...(note ? { note } : {}) } };
}

/** She comes home with something: `prey return` or `pulp return`. */
export function load(at: WallTime, behaviour: 'prey return' | 'pulp return'): ActStory {
  return { at, kind: 'behaviour.add', body: { mode: 'load', behaviour } };
}

/** The first note of a nest or a visit. */
export function note(at: WallTime, entity: 'nest' | 'visit', text: string): ActStory {
  return { at, kind: 'note.set', body: { entity, text, base: null } };
}

/** The first value of a field of a nest. */
export function nestField(at: WallTime, field: string, value: number | string): ActStory {
  return { at, kind: 'field.set', body: { entity: 'nest', field, value, base: null } };
}

/** The first value of a field of a visit. */
export function visitField(at: WallTime, field: string, value: number | string): ActStory {
  return { at, kind: 'field.set', body: { entity: 'visit', field, value, base: null } };
}

/** A sting: where, and what was felt. The person stays unnamed. */
export function sting(at: WallTime, { bodySite, symptoms, note: text }: StingStory): ActStory {
  return { at, kind: 'sting.add', body: { bodySite, symptoms: [...symptoms], note: text } };
}

type StingStory = Required<Pick<OpBody<'sting.add'>, 'symptoms'>> & { bodySite: string; note: string };
