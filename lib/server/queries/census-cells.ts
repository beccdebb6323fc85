import 'server-only';
import { groupBy } from '@/lib/kit/group-by';
import { type BlindVisits, blindVisits, isHidden } from './blind-visits';
import { censusOf } from './census';
import { idKey } from './id-key';
import { type VisitRow, visitsOfNests } from './nest-rows';
import { readingCells } from './reading-cells';
import { type ReadingRow, readingsOfNests } from './reading-rows';
import { chosenReadings } from './review/primary-choices';
import type { TeamScope } from './team-scope';

/** What the list says about one nest beside its own row. */
export interface NestWork {
  /** Not archived, in the order they began. */
  visits: VisitRow[];
  /** The readings of the latest visit that has any. */
  readings: ReadingRow[];
  /** Cells of that visit's census; null without a census, or while it must not be seen. */
  cells: number | null;
}

/** The readings of the latest of some visits that was read. */
function latestReadings(visits: readonly VisitRow[], byVisit: ReadonlyMap<string, ReadingRow[]>): ReadingRow[] {
  const read = visits.findLast((visit) => byVisit.has(idKey(visit.id)));
  return (read && byVisit.get(idKey(read.id))) ?? [];
}

/** The census of a visit unless it is kept from the person who asks. */
function shownCensus(
  readings: readonly ReadingRow[],
  scope: TeamScope,
  { blind, chosen }: { blind: BlindVisits; chosen: ReadonlySet<string> },
): ReadingRow | null {
  const census = censusOf(readings, chosen);
  return census && !isHidden(census, scope, blind) ? census : null;
}

/** The visits, latest readings and census size of some nests, by `idKey` of the nest. */
export async function nestWork(scope: TeamScope, nests: readonly Buffer[]): Promise<Map<string, NestWork>> {
  const visits = (await visitsOfNests(scope, nests)).filter((visit) => visit.archived_at === null);
  const visitsByNest = groupBy(visits, (visit) => idKey(visit.nest_id));
  const byVisit = groupBy(await readingsOfNests(scope, nests), (reading) => idKey(reading.visit_id));
  const blind = await blindVisits(scope);
  const chosen = await chosenReadings(
    scope,
    visits.map((visit) => visit.id),
  );
  const work = nests.map((nest) => {
    const own = visitsByNest.get(idKey(nest)) ?? [];
    const readings = latestReadings(own, byVisit);
    return { nest, visits: own, readings, census: shownCensus(readings, scope, { blind, chosen }) };
  });
  const cells = await readingCells(
    scope,
    work.flatMap(({ census }) => census ?? []),
  );
  return new Map(
    work.map(({ nest, visits: own, readings, census }) => [
      idKey(nest),
      { visits: own, readings, cells: census && (cells.get(idKey(census.id))?.length ?? 0) },
    ]),
  );
}
