import 'server-only';
import type { InferAttributes } from 'sequelize';
import { isUuidText } from '@/lib/kit/uuid';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import type { Nest } from '@/models/nest';
import type { Visit } from '@/models/visit';
import type { TeamScope } from './team-scope';

/** A nest as stored. */
export type NestRow = InferAttributes<Nest>;

/** A visit as stored. */
export type VisitRow = InferAttributes<Visit>;

/**
 * One nest of the team.
 *
 * @param id as it stands in the address; anything may have been typed there.
 * @throws HttpProblem `not-found` for an unknown id or another team's.
 */
export async function nestById({ team, db, transaction }: TeamScope, id: string): Promise<NestRow> {
  const nest = isUuidText(id)
    ? await db.models.Nest.findOne({ where: { team_id: team, id: toBinary(id) }, raw: true, transaction })
    : null;
  if (!nest) throw new HttpProblem('not-found');
  return nest;
}

/** The visits of some nests in the order they began, archived ones included. */
export async function visitsOfNests(
  { team, db, transaction }: TeamScope,
  nests: readonly Buffer[],
): Promise<VisitRow[]> {
  if (nests.length === 0) return [];
  return db.models.Visit.findAll({
    where: { team_id: team, nest_id: [...nests] },
    order: [
      ['started_at', 'ASC'],
      ['id', 'ASC'],
    ],
    raw: true,
    transaction,
  });
}
