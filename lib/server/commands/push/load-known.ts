import 'server-only';
import { Op as Operator, type Transaction, type WhereOptions } from 'sequelize';
import { entityOf } from '@/lib/protocol/entity-of';
import { registerOf, registerSetOf } from '@/lib/protocol/register-of';
import type { ValidOp } from '@/lib/protocol/validate-op';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { fromBinary, fromBinaryOrNull, toBinary } from '@/lib/server/db/uuid-binary';
import { storedOp } from '@/lib/server/db/stored-op';
import { namedOps } from './check-references';
import type { World } from './world';

/** What loading works on. */
interface Loading {
  ctx: TeamContext;
  transaction: Transaction;
  world: World;
}

/** Distinct ids of a list that may have gaps, without those already known. */
function newIds(ids: readonly (string | null)[], known: ReadonlyMap<string, unknown> | ReadonlySet<string>): Buffer[] {
  const wanted = new Set(ids.filter((id): id is string => id !== null && !known.has(id)));
  return [...wanted].map(toBinary);
}

async function loadOps({ ctx, transaction, world }: Loading, where: WhereOptions): Promise<void> {
  const rows = await database().models.Op.findAll({ where: { team_id: toBinary(ctx.teamId), ...where }, transaction });
  for (const row of rows) {
    const op = storedOp(row.op);
    const register = registerOf(op);
    world.ops.set(op.opId, {
      seq: Number(row.seq),
      bodyHash: op.bodyHash,
      kind: op.kind,
      nest: op.nest,
      visit: op.visit,
      reading: op.reading,
      actorId: fromBinary(row.actor_id),
      register,
    });
    const sets = register === null ? undefined : world.registers.get(register);
    if (sets && !sets.some((set) => set.opId === op.opId)) sets.push(registerSetOf(op));
  }
}

async function loadNests({ ctx, transaction, world }: Loading, ids: Buffer[]): Promise<void> {
  if (ids.length === 0) return;
  const where = { team_id: toBinary(ctx.teamId), id: ids };
  for (const row of await database().models.Nest.findAll({ where, transaction })) {
    world.nests.set(fromBinary(row.id), { archived: row.archived_at !== null });
  }
}

async function loadVisits({ ctx, transaction, world }: Loading, ids: Buffer[]): Promise<void> {
  if (ids.length === 0) return;
  const where = { team_id: toBinary(ctx.teamId), id: ids };
  for (const row of await database().models.Visit.findAll({ where, transaction })) {
    world.visits.set(fromBinary(row.id), { nest: fromBinary(row.nest_id), archived: row.archived_at !== null });
  }
}

/** Readings, with the lock of the final reading that was made from each. */
async function loadReadings({ ctx, transaction, world }: Loading, ids: Buffer[]): Promise<void> {
  if (ids.length === 0) return;
  const where = { team_id: toBinary(ctx.teamId), [Operator.or]: [{ id: ids }, { based_on: ids }] };
  const rows = await database().models.Reading.findAll({ where, transaction });
  const lockedSources = rows.filter((row) => row.version !== null && row.locked_version === row.version);
  const locked = new Set(lockedSources.map((row) => fromBinaryOrNull(row.based_on)));
  for (const row of rows) {
    const id = fromBinary(row.id);
    world.readings.set(id, {
      nest: fromBinary(row.nest_id),
      visit: fromBinary(row.visit_id),
      kind: row.kind,
      openedBy: fromBinary(row.opened_by),
      submitted: row.submitted_at !== null,
      locked: locked.has(id),
    });
  }
}

async function loadRetractions({ ctx, transaction, world }: Loading, targets: Buffer[]): Promise<void> {
  if (targets.length === 0) return;
  const where = { team_id: toBinary(ctx.teamId), target: targets };
  for (const row of await database().models.Retraction.findAll({ where, transaction })) {
    world.retracted.add(fromBinary(row.target));
  }
}

/** All settings of every register that these operations set. */
async function loadRegisters(loading: Loading, ops: readonly ValidOp[]): Promise<void> {
  const { world } = loading;
  const entities: { [column: string]: Buffer }[] = [];
  for (const op of ops) {
    const register = registerOf(op);
    const entity = entityOf(op);
    if (register === null || !entity || world.registers.has(register)) continue;
    world.registers.set(register, []);
    entities.push({ [`${entity.type}_id`]: toBinary(entity.id) });
  }
  if (entities.length === 0) return;
  await loadOps(loading, { kind: ['field.set', 'note.set'], [Operator.or]: entities });
}

/**
 * Reads everything that deciding about these operations needs and the world does not hold yet. Every query names the
 * team, so that another team's ids are simply not found.
 */
export async function loadKnown(loading: Loading, ops: readonly ValidOp[]): Promise<void> {
  const { world } = loading;
  const opIds = newIds(
    ops.flatMap((op) => [op.opId, ...namedOps(op)]),
    world.ops,
  );
  if (opIds.length > 0) await loadOps(loading, { op_id: opIds });
  await loadReadings(
    loading,
    newIds(
      ops.map((op) => op.reading),
      world.readings,
    ),
  );
  const visits = [...ops.map((op) => op.visit), ...[...world.readings.values()].map((reading) => reading.visit)];
  await loadVisits(loading, newIds(visits, world.visits));
  const nests = [...ops.map((op) => op.nest), ...[...world.visits.values()].map((visit) => visit.nest)];
  await loadNests(loading, newIds(nests, world.nests));
  const targets = ops.flatMap((op) => (op.kind === 'cell.retract' ? [String(op.body.target)] : []));
  await loadRetractions(loading, newIds(targets, world.retracted));
  await loadRegisters(loading, ops);
}
