import 'server-only';
import { HttpProblem } from '@/lib/server/http/problem';
import { nestCondition } from '@/lib/server/queries/nest-conditions';
import { selectRows } from '@/lib/server/queries/select-rows';
import type { Snapshot } from './snapshot';

/**
 * A nest that is asked for by code must be one of the team's.
 *
 * @throws HttpProblem `not-found` when it is not.
 */
export async function requireNest({ scope }: Snapshot, code: string | undefined, zone: string): Promise<void> {
  if (code === undefined) return;
  const { sql, values } = nestCondition({ code }, zone);
  const [found] = await selectRows(scope, `SELECT 1 FROM nests n WHERE ${sql} LIMIT 1`, values);
  if (!found) throw new HttpProblem('not-found');
}
