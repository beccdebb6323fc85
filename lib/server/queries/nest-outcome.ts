import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { nestById } from './nest-rows';
import { teamScope } from './team-scope';

/** How the work on a nest ended. */
export interface NestOutcome {
  outcome: string;
  /** `YYYY-MM-DD`. */
  decidedOn: string;
  note: string | null;
}

/**
 * The latest outcome of a nest; null while there is none.
 *
 * @throws HttpProblem `not-found` for an unknown nest or another team's.
 */
export async function nestOutcome(ctx: TeamContext, id: string): Promise<NestOutcome | null> {
  const scope = teamScope(ctx);
  const nest = await nestById(scope, id);
  const row = await scope.db.models.Outcome.findOne({
    where: { team_id: scope.team, nest_id: nest.id },
    order: [
      ['decided_on', 'DESC'],
      ['id', 'DESC'],
    ],
    raw: true,
  });
  return row && { outcome: row.outcome, decidedOn: row.decided_on, note: row.note };
}
