import 'server-only';
import type { InferAttributes } from 'sequelize';
import type { Reading } from '@/models/reading';
import type { TeamScope } from './team-scope';

/** A reading as stored. */
export type ReadingRow = InferAttributes<Reading>;

/** The readings of some nests, in the order they were opened. */
export async function readingsOfNests(scope: TeamScope, nests: readonly Buffer[]): Promise<ReadingRow[]> {
  if (nests.length === 0) return [];
  return scope.db.models.Reading.findAll({
    where: { team_id: scope.team, nest_id: [...nests] },
    order: [
      ['opened_at', 'ASC'],
      ['id', 'ASC'],
    ],
    raw: true,
    transaction: scope.transaction,
  });
}

/** One reading; null when the team has none of this id. */
export async function readingById(scope: TeamScope, id: Buffer): Promise<ReadingRow | null> {
  return scope.db.models.Reading.findOne({
    where: { team_id: scope.team, id },
    raw: true,
    transaction: scope.transaction,
  });
}

/** The final reading made from a source reading; null before it is settled or locked. */
export async function finalOf(scope: TeamScope, source: Buffer): Promise<ReadingRow | null> {
  return scope.db.models.Reading.findOne({
    where: { team_id: scope.team, based_on: source },
    raw: true,
    transaction: scope.transaction,
  });
}
