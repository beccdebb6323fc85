import 'server-only';
import { isUuidText } from '@/lib/kit/uuid';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { type ReadingAnswer, presentReading } from '@/lib/server/presenters/present-reading';
import { blindVisits, isHidden } from './blind-visits';
import { idKey } from './id-key';
import { memberNames } from './member-names';
import { readingCells } from './reading-cells';
import { type ReadingRow, finalOf, readingById } from './reading-rows';
import { type TeamScope, teamScope } from './team-scope';

/**
 * A reading that the person who asks may see.
 *
 * @param id as it stands in the address; anything may have been typed there.
 * @throws HttpProblem `not-found` for an unknown id or another team's, `blind` while an own second reading is open.
 */
export async function visibleReading(scope: TeamScope, id: string): Promise<ReadingRow> {
  const reading = isUuidText(id) ? await readingById(scope, toBinary(id)) : null;
  if (!reading) throw new HttpProblem('not-found');
  if (isHidden(reading, scope, await blindVisits(scope))) throw new HttpProblem('blind');
  return reading;
}

/** The version at which the final reading of a source (or of itself) was last locked. */
async function lockedVersionOf(scope: TeamScope, reading: ReadingRow): Promise<number | null> {
  const final = reading.kind === 'final' ? reading : await finalOf(scope, reading.id);
  return final?.locked_version ?? null;
}

/** `GET /api/readings/<id>`: the live marks (of a final reading: with what was settled) and their tally. */
export async function readingDetail(ctx: TeamContext, id: string): Promise<ReadingAnswer> {
  const scope = teamScope(ctx);
  const reading = await visibleReading(scope, id);
  const nameOf = await memberNames(scope);
  const cells = await readingCells(scope, [reading]);
  const facts = { observer: nameOf(reading.opened_by), lockedVersion: await lockedVersionOf(scope, reading) };
  return presentReading(reading, facts, cells.get(idKey(reading.id)) ?? []);
}
