import 'server-only';
import type { CreationAttributes, Transaction } from 'sequelize';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import type { Mark } from '@/models/mark';
import type { Nest } from '@/models/nest';
import type { Op } from '@/models/op';
import type { Reading } from '@/models/reading';
import type { Retraction } from '@/models/retraction';
import type { Visit } from '@/models/visit';

/** Changed columns of rows, by the row's id. */
type Changes<Row> = Map<string, Partial<Row>>;

/** Everything a push is going to write, gathered while operations are decided and written in a few statements. */
export interface Writes {
  ops: CreationAttributes<Op>[];
  nests: CreationAttributes<Nest>[];
  visits: CreationAttributes<Visit>[];
  readings: CreationAttributes<Reading>[];
  marks: CreationAttributes<Mark>[];
  retractions: CreationAttributes<Retraction>[];
  nestChanges: Changes<CreationAttributes<Nest>>;
  visitChanges: Changes<CreationAttributes<Visit>>;
  readingChanges: Changes<CreationAttributes<Reading>>;
}

/** Nothing to write yet. */
export function noWrites(): Writes {
  return {
    ops: [],
    nests: [],
    visits: [],
    readings: [],
    marks: [],
    retractions: [],
    nestChanges: new Map(),
    visitChanges: new Map(),
    readingChanges: new Map(),
  };
}

/** Adds changed columns to those already noted for a row. */
export function noteChange<Row>(changes: Changes<Row>, id: string, columns: Partial<Row>): void {
  changes.set(id, { ...changes.get(id), ...columns });
}

/** Writes it all, parents before children. Plain inserts: a row that exists already is an error, never skipped. */
export async function writeRows(ctx: TeamContext, writes: Writes, transaction: Transaction): Promise<void> {
  const { Op, Nest, Visit, Reading, Mark, Retraction } = database().models;
  await Op.bulkCreate(writes.ops, { transaction });
  await Nest.bulkCreate(writes.nests, { transaction });
  await Visit.bulkCreate(writes.visits, { transaction });
  await Reading.bulkCreate(writes.readings, { transaction });
  await Mark.bulkCreate(writes.marks, { transaction });
  await Retraction.bulkCreate(writes.retractions, { transaction });
  const rowOf = (id: string) => ({ where: { team_id: toBinary(ctx.teamId), id: toBinary(id) }, transaction });
  for (const [id, columns] of writes.nestChanges) await Nest.update(columns, rowOf(id));
  for (const [id, columns] of writes.visitChanges) await Visit.update(columns, rowOf(id));
  for (const [id, columns] of writes.readingChanges) await Reading.update(columns, rowOf(id));
}
