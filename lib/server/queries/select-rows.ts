import 'server-only';
import { type BindOrReplacements, QueryTypes } from 'sequelize';
import type { TeamScope } from './team-scope';

/**
 * Rows of a written SELECT, in the scope's transaction.
 *
 * @param sql with `:team` in every table's condition; values only ever come in as named replacements.
 */
export async function selectRows<Row extends object>(
  scope: TeamScope,
  sql: string,
  values: Record<string, unknown> & BindOrReplacements = {},
): Promise<Row[]> {
  return scope.db.sequelize.query<Row>(sql, {
    type: QueryTypes.SELECT,
    replacements: { ...values, team: scope.team },
    transaction: scope.transaction,
  });
}
