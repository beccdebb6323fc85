import 'server-only';
import { isUuidText } from '@/lib/kit/uuid';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { instantText } from '@/lib/server/presenters/instant-text';
import { memberNames } from '@/lib/server/queries/member-names';
import { teamScope } from '@/lib/server/queries/team-scope';
import { claimOf } from './claims';
import { reviewVisit } from './review-visits';

/** What a second reader is told about the visit before reading: no number, no state, no note of the first reading. */
export interface SecondDesk {
  visit: string;
  nest: string;
  code: string;
  name: string | null;
  purpose: string;
  startedAt: string;
  /** Who has taken it on; null while nobody has. */
  reader: string | null;
  /** Is that the person who asks? */
  mine: boolean;
  /** The asker's own second reading that is still open; null before it is begun. */
  reading: string | null;
  /** The asker has handed in a second reading. */
  done: boolean;
}

/**
 * The desk of a second reading.
 *
 * @param id of the visit, as it stands in the address.
 * @throws HttpProblem `not-found` for an unknown visit or another team's.
 */
export async function secondDesk(ctx: TeamContext, id: string): Promise<SecondDesk> {
  const scope = teamScope(ctx);
  const item = isUuidText(id) ? await reviewVisit(scope, toBinary(id)) : null;
  if (!item) throw new HttpProblem('not-found');
  const { visit, openSeconds, second } = item;
  const claim = await claimOf(scope, visit.id);
  const nameOf = await memberNames(scope);
  const own = openSeconds.find(({ opened_by }) => opened_by.equals(scope.user));
  return {
    visit: id,
    nest: fromBinary(visit.nest),
    code: visit.code,
    name: visit.name,
    purpose: visit.purpose,
    startedAt: instantText(visit.startedAtText, visit.startedAt),
    reader: claim && nameOf(claim.user_id),
    mine: claim?.user_id.equals(scope.user) ?? false,
    reading: own ? fromBinary(own.id) : null,
    done: !own && (second?.opened_by.equals(scope.user) ?? false),
  };
}
