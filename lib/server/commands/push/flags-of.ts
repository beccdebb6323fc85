import 'server-only';
import type { OpFlag } from '@/lib/protocol/op-codes';
import { hasClockFlag, isDoubtfulPlace, placeOf } from '@/lib/protocol/op-flags';
import { basesOf, registerWinner } from '@/lib/protocol/register';
import { registerOf } from '@/lib/protocol/register-of';
import type { ValidOp } from '@/lib/protocol/validate-op';
import type { World } from './world';

const CHANGES_CELLS: ReadonlySet<string> = new Set(['cell.mark', 'cell.retract']);

function isLate(world: World, op: ValidOp): boolean {
  const reading = op.reading !== null && CHANGES_CELLS.has(op.kind) ? world.readings.get(op.reading) : undefined;
  return reading !== undefined && (reading.submitted || reading.locked);
}

/** Was the edit made from anything but the value that is shown now? */
function isConflict(world: World, op: ValidOp): boolean {
  const register = registerOf(op);
  const winner = register === null ? null : registerWinner(world.registers.get(register) ?? []);
  return winner !== null && !basesOf(op.body.base).includes(winner.opId);
}

function hasPlaceFlag(world: World, op: ValidOp): boolean {
  const isPlaceField = op.kind === 'field.set' && op.body.field === 'place';
  const place = placeOf(isPlaceField ? op.body.value : op.body.place);
  return place !== null && isDoubtfulPlace(place, world.home);
}

function isArchived(world: World, op: ValidOp): boolean {
  if (op.kind === 'entity.archive') return false;
  const reading = op.reading === null ? undefined : world.readings.get(op.reading);
  const visitId = op.visit ?? reading?.visit;
  const visit = visitId === undefined ? undefined : world.visits.get(visitId);
  const nestId = op.nest ?? visit?.nest;
  const nest = nestId === undefined ? undefined : world.nests.get(nestId);
  return visit?.archived === true || nest?.archived === true;
}

/** What is surprising about an operation that is applied all the same; asked before it is applied. */
export function flagsOf(world: World, op: ValidOp, receivedMs: number): OpFlag[] {
  const flags: OpFlag[] = [];
  if (hasClockFlag(op.at, receivedMs)) flags.push('clock');
  if (isLate(world, op)) flags.push('late');
  if (isConflict(world, op)) flags.push('conflict');
  if (hasPlaceFlag(world, op)) flags.push('place');
  if (isArchived(world, op)) flags.push('archived');
  return flags;
}
