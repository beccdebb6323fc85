import 'server-only';
import type { InferAttributes } from 'sequelize';
import { idKey } from '@/lib/server/queries/id-key';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import type { PrimaryChoice } from '@/models/primary-choice';

/** The choice of one of several field readings, as stored. */
export type PrimaryChoiceRow = InferAttributes<PrimaryChoice>;

/** The latest choice of each visit, by `idKey` of the visit; a visit nobody chose for is not in it. */
export async function primaryChoices(
  { team, db, transaction }: TeamScope,
  visits: readonly Buffer[],
): Promise<Map<string, PrimaryChoiceRow>> {
  if (visits.length === 0) return new Map();
  const rows = await db.models.PrimaryChoice.findAll({
    where: { team_id: team, visit_id: [...visits] },
    order: [['position', 'ASC']],
    raw: true,
    transaction,
  });
  return new Map(rows.map((row) => [idKey(row.visit_id), row]));
}

/** The readings (keys of `idKey`) that were chosen at these visits. */
export async function chosenReadings(scope: TeamScope, visits: readonly Buffer[]): Promise<ReadonlySet<string>> {
  return new Set([...(await primaryChoices(scope, visits)).values()].map((row) => idKey(row.reading_id)));
}
