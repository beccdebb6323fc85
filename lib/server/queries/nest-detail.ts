import 'server-only';
import { groupBy } from '@/lib/kit/group-by';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { type NestAnswer, presentNest, presentVisit } from '@/lib/server/presenters/present-nest';
import { type ReadingSummary, presentReadingSummary } from '@/lib/server/presenters/present-reading';
import { blindVisits, isHidden } from './blind-visits';
import { idKey } from './id-key';
import { lockedVersions } from './locked-versions';
import { memberNames } from './member-names';
import { nestById, visitsOfNests } from './nest-rows';
import { readingCells } from './reading-cells';
import { type ReadingRow, readingsOfNests } from './reading-rows';
import { type TeamScope, teamScope } from './team-scope';

/** Readings with their tallies, by `idKey` of the visit; tallies that must not be seen are null. */
async function summariesByVisit(
  scope: TeamScope,
  readings: readonly ReadingRow[],
): Promise<Map<string, ReadingSummary[]>> {
  const blind = await blindVisits(scope);
  const cells = await readingCells(
    scope,
    readings.filter((reading) => !isHidden(reading, scope, blind)),
  );
  const nameOf = await memberNames(scope);
  const locked = lockedVersions(readings);
  const byVisit = groupBy(readings, (reading) => idKey(reading.visit_id));
  const summary = (reading: ReadingRow) =>
    presentReadingSummary(
      reading,
      { observer: nameOf(reading.opened_by), lockedVersion: locked.get(idKey(reading.id)) ?? null },
      cells.get(idKey(reading.id)) ?? null,
    );
  return new Map([...byVisit].map(([visit, members]) => [visit, members.map(summary)]));
}

/** `GET /api/nests/<id>`: one nest with its visits and readings, each in the order it began. */
export async function nestDetail(ctx: TeamContext, id: string): Promise<NestAnswer> {
  const scope = teamScope(ctx);
  const nest = await nestById(scope, id);
  const visits = await visitsOfNests(scope, [nest.id]);
  const summaries = await summariesByVisit(scope, await readingsOfNests(scope, [nest.id]));
  return presentNest(
    ctx.role,
    nest,
    visits.map((visit) => presentVisit(visit, summaries.get(idKey(visit.id)) ?? [])),
  );
}
