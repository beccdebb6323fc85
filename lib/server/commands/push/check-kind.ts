import 'server-only';
import { entityOf } from '@/lib/protocol/entity-of';
import type { OpKind } from '@/lib/protocol/op';
import { basesOf } from '@/lib/protocol/register';
import { registerOf } from '@/lib/protocol/register-of';
import type { ValidOp } from '@/lib/protocol/validate-op';
import { NO_RIGHT, type Objection, quarantined } from './decision';
import type { Actor, World } from './world';

/** What a check looks at. */
interface Question {
  world: World;
  op: ValidOp;
  by: Actor;
}

/** May this role take back marks of other people? */
function mayRetractForOthers({ role }: Actor): boolean {
  return role === 'reviewer' || role === 'biologist';
}

/** Only the person who opened a reading records in it; nobody records in a final one. */
function checkOwnReading({ world, op, by }: Question): Objection | null {
  const reading = op.reading === null ? undefined : world.readings.get(op.reading);
  return reading?.openedBy === by.userId && reading.kind !== 'final' ? null : NO_RIGHT;
}

function checkRetraction({ world, op, by }: Question): Objection | null {
  const target = String(op.body.target);
  const mark = world.ops.get(target);
  if (mark?.kind !== 'cell.mark' || mark.reading !== op.reading) return quarantined('target');
  if (mark.actorId !== by.userId && !mayRetractForOthers(by)) return NO_RIGHT;
  return world.retracted.has(target) ? quarantined('retracted') : null;
}

/** An edit starts from the same register, or from the operation that opened the entity. */
function checkBases({ world, op }: Question): Objection | null {
  const register = registerOf(op);
  const entity = entityOf(op);
  const fits = basesOf(op.body.base).every((id) => {
    const base = world.ops.get(id);
    const opens = entity !== null && base?.kind === `${entity.type}.open` && base[entity.type] === entity.id;
    return opens || (base !== undefined && base.register === register);
  });
  return fits ? null : quarantined('base');
}

const CHECKS: Partial<Record<OpKind, (question: Question) => Objection | null>> = {
  'nest.open': ({ world, op }) => (op.nest !== null && world.nests.has(op.nest) ? quarantined('exists') : null),
  'visit.open': ({ world, op }) => (op.visit !== null && world.visits.has(op.visit) ? quarantined('exists') : null),
  'reading.open': ({ world, op }) =>
    op.reading !== null && world.readings.has(op.reading) ? quarantined('exists') : null,
  'cell.mark': checkOwnReading,
  'reading.submit': checkOwnReading,
  'cell.retract': checkRetraction,
  'field.set': checkBases,
  'note.set': checkBases,
};

/** What only operations of one kind have to fulfil. */
export function checkKind(question: Question): Objection | null {
  return CHECKS[question.op.kind]?.(question) ?? null;
}
