import { entityOf } from './entity-of';
import type { Op } from './op';
import { type RegisterSet, basesOf } from './register';

type AboutRegister = Pick<Op, 'kind' | 'nest' | 'visit' | 'reading' | 'body'>;

/** The name, within a team, of the register that a `field.set` or `note.set` sets; null for other operations. */
export function registerOf(op: AboutRegister): string | null {
  if (op.kind !== 'field.set' && op.kind !== 'note.set') return null;
  const entity = entityOf(op);
  const field = op.kind === 'field.set' ? String(op.body.field) : '';
  return entity && `${op.kind} ${entity.type} ${entity.id} ${field}`;
}

/** A `field.set` or `note.set` as an entry of its register. */
export function registerSetOf({ opId, hlc, kind, body }: Pick<Op, 'opId' | 'hlc' | 'kind' | 'body'>): RegisterSet {
  const value = kind === 'field.set' ? body.value : body.text;
  return { opId, hlc, bases: basesOf(body.base), value: value ?? null };
}
