import 'server-only';
import type { ReadCell } from '@/lib/comb/final-cells';
import { groupBy } from '@/lib/kit/group-by';
import { localDate } from '@/lib/kit/local-date';
import { blindVisits } from './blind-visits';
import { idKey } from './id-key';
import { instantRange } from './local-date-range';
import type { VisitRow } from './nest-rows';
import { readingCells } from './reading-cells';
import { type ReadingPair, pairsOfVisit } from './reading-pairs';
import { type ReadingRow, readingsOfNests } from './reading-rows';
import { selectRows } from './select-rows';
import type { TeamScope } from './team-scope';

/** Two readings of one comb with their cells. */
export interface ComparedPair extends ReadingPair {
  /** `YYYY-MM`, local to the nest. */
  month: string;
  nest: Buffer;
  firstCells: ReadCell[];
  secondCells: ReadCell[];
}

/** A locked reading beside the one it was settled from. */
export interface LockedPair {
  source: ReadingRow;
  sourceCells: ReadCell[];
  finalCells: ReadCell[];
}

/** What a season's readings can be compared on. */
export interface ComparedSeason {
  pairs: ComparedPair[];
  locked: LockedPair[];
}

/** Readings whose cells are made at once. */
const CHUNK = 200;

async function cellsOfAll(scope: TeamScope, readings: readonly ReadingRow[]): Promise<Map<string, ReadCell[]>> {
  const all = new Map<string, ReadCell[]>();
  for (let start = 0; start < readings.length; start += CHUNK) {
    for (const [id, cells] of await readingCells(scope, readings.slice(start, start + CHUNK), 'locked')) {
      all.set(id, cells);
    }
  }
  return all;
}

/** The visits of a year that the person who asks may compare, with their readings. */
async function visitsOfYear(scope: TeamScope, zone: string, year: string) {
  const { from, before } = instantRange({ from: `${year}-01-01`, to: `${year}-12-31` }, zone);
  const visits = await selectRows<VisitRow>(
    scope,
    `SELECT * FROM visits WHERE team_id = :team AND archived_at IS NULL AND started_at >= :from AND started_at < :before
     ORDER BY started_at, id`,
    { from, before },
  );
  const nests = [...new Map(visits.map(({ nest_id }) => [idKey(nest_id), nest_id])).values()];
  const byVisit = groupBy(await readingsOfNests(scope, nests), ({ visit_id }) => idKey(visit_id));
  const blind = await blindVisits(scope);
  return visits
    .filter(({ id }) => !blind.has(idKey(id)))
    .map((visit) => ({ visit, readings: byVisit.get(idKey(visit.id)) ?? [] }));
}

/**
 * Everything of one year that two people read, and everything that was locked; without visits at which the person who
 * asks has an own second reading open.
 */
export async function comparedSeason(scope: TeamScope, zone: string, year: string): Promise<ComparedSeason> {
  const visits = await visitsOfYear(scope, zone, year);
  const pairs = visits.flatMap(({ visit, readings }) => pairsOfVisit(readings).map((pair) => ({ visit, pair })));
  const locked = visits.flatMap(({ readings }) =>
    readings.flatMap((final) => {
      const source = readings.find(({ id }) => final.based_on?.equals(id));
      return source && final.locked_version !== null ? [{ source, final }] : [];
    }),
  );
  const needed = [
    ...pairs.flatMap(({ pair }) => [pair.first, pair.second]),
    ...locked.flatMap((pair) => [pair.source, pair.final]),
  ];
  const unique = [...new Map(needed.map((reading) => [idKey(reading.id), reading])).values()];
  const cells = await cellsOfAll(scope, unique);
  const cellsOf = ({ id }: ReadingRow) => cells.get(idKey(id)) ?? [];
  return {
    pairs: pairs.map(({ visit, pair }) => ({
      ...pair,
      month: localDate(visit.started_at.getTime(), zone).slice(0, 7),
      nest: visit.nest_id,
      firstCells: cellsOf(pair.first),
      secondCells: cellsOf(pair.second),
    })),
    locked: locked.map(({ source, final }) => ({ source, sourceCells: cellsOf(source), finalCells: cellsOf(final) })),
  };
}
