import 'server-only';
import { entityOf } from '@/lib/protocol/entity-of';
import type { OpKind } from '@/lib/protocol/op';
import { basesOf } from '@/lib/protocol/register';
import type { ValidOp } from '@/lib/protocol/validate-op';
import { type Objection, quarantined } from './decision';
import type { World } from './world';

type Names = Pick<ValidOp, 'nest' | 'visit' | 'reading'>;

const isAny = ({ nest, visit, reading }: Names) => (nest ?? visit ?? reading) !== null;

/** Which entities an operation of each kind has to name. */
const NAMES_ENOUGH: Record<OpKind, (op: ValidOp) => boolean> = {
  'nest.open': ({ nest }) => nest !== null,
  'visit.open': ({ nest, visit }) => nest !== null && visit !== null,
  'reading.open': ({ visit, reading }) => visit !== null && reading !== null,
  'cell.mark': ({ reading }) => reading !== null,
  'cell.retract': ({ reading }) => reading !== null,
  'reading.submit': ({ reading }) => reading !== null,
  'field.set': (op) => entityOf(op) !== null,
  'note.set': (op) => entityOf(op) !== null,
  'entity.archive': (op) => entityOf(op) !== null,
  'step.mark': isAny,
  'behaviour.add': isAny,
  'sting.add': isAny,
  'photo.attach': isAny,
  'photo.detach': isAny,
};

/** Operations that others have to come after: named dependencies, the target of a retraction, the bases of an edit. */
export function namedOps(op: ValidOp): string[] {
  const target = op.kind === 'cell.retract' ? [String(op.body.target)] : [];
  return [...op.deps, ...target, ...basesOf(op.body.base)];
}

/** What an operation names and the team does not have (yet). Another team's ids are simply missing. */
function missingOf(world: World, op: ValidOp): string[] {
  const missing = namedOps(op).filter((id) => !world.ops.has(id));
  const { kind, nest, visit, reading } = op;
  if (nest !== null && kind !== 'nest.open' && !world.nests.has(nest)) missing.push(nest);
  if (visit !== null && kind !== 'visit.open' && !world.visits.has(visit)) missing.push(visit);
  if (reading !== null && kind !== 'reading.open' && !world.readings.has(reading)) missing.push(reading);
  return missing;
}

/** Do the named entities belong to each other? A name left out cannot disagree. */
function belongTogether(world: World, { kind, nest, visit, reading }: ValidOp): boolean {
  const knownVisit = visit === null || kind === 'visit.open' ? null : world.visits.get(visit);
  if (knownVisit && nest !== null && knownVisit.nest !== nest) return false;
  const knownReading = reading === null || kind === 'reading.open' ? null : world.readings.get(reading);
  if (!knownReading) return true;
  return (visit === null || knownReading.visit === visit) && (nest === null || knownReading.nest === nest);
}

/** Does the operation name what it must, and things that exist and belong together? */
export function checkReferences(world: World, op: ValidOp): Objection | null {
  if (!NAMES_ENOUGH[op.kind](op)) return quarantined('entity');
  const missing = missingOf(world, op);
  if (missing.length > 0) return { r: 'parked', code: 'deps', missing };
  return belongTogether(world, op) ? null : quarantined('entity');
}
