import 'server-only';
import { groupBy } from '@/lib/kit/group-by';
import { idKey } from '@/lib/server/queries/id-key';
import { type ReadingRow, readingsOfNests } from '@/lib/server/queries/reading-rows';
import { selectRows } from '@/lib/server/queries/select-rows';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import { primaryChoices } from './primary-choices';
import { type VisitReadings, visitReadings } from './visit-readings';

/** A visit with the nest it belongs to. */
export interface ReviewVisitRow {
  id: Buffer;
  nest: Buffer;
  purpose: string;
  startedAt: Date;
  startedAtText: string;
  code: string;
  name: string | null;
  taxon: string | null;
}

/** A visit and its readings by their part in the review. */
export interface ReviewVisit extends VisitReadings {
  visit: ReviewVisitRow;
}

const VISIT = `
  SELECT v.id, v.nest_id AS nest, v.purpose, v.started_at AS startedAt, v.started_at_text AS startedAtText,
         n.code, n.name, n.taxon
  FROM visits v JOIN nests n ON n.team_id = :team AND n.id = v.nest_id
  WHERE v.team_id = :team AND v.archived_at IS NULL AND n.archived_at IS NULL`;

/** Visits with a field reading handed in whose final reading is not locked, or was overtaken by later marks. */
const WAITING = `
  AND EXISTS (SELECT 1 FROM readings f WHERE f.team_id = :team AND f.visit_id = v.id AND f.kind = 'field'
              AND f.submitted_at IS NOT NULL)
  AND NOT EXISTS (SELECT 1 FROM readings l WHERE l.team_id = :team AND l.visit_id = v.id AND l.kind = 'final'
              AND l.locked_version = l.version AND NOT EXISTS (
                SELECT 1 FROM ops o WHERE o.team_id = :team AND o.reading_id = l.based_on
                AND o.kind IN ('cell.mark', 'cell.retract') AND o.seq > l.base_seq))`;

async function withReadings(scope: TeamScope, visits: readonly ReviewVisitRow[]): Promise<ReviewVisit[]> {
  const byVisit = groupBy(
    await readingsOfNests(
      scope,
      visits.map(({ nest }) => nest),
    ),
    ({ visit_id }) => idKey(visit_id),
  );
  const choices = await primaryChoices(
    scope,
    visits.map(({ id }) => id),
  );
  return visits.map((visit) => {
    const readings: readonly ReadingRow[] = byVisit.get(idKey(visit.id)) ?? [];
    return { visit, ...visitReadings(readings, choices.get(idKey(visit.id)) ?? null) };
  });
}

/** Every visit that waits for something in the lab. */
export async function waitingVisits(scope: TeamScope): Promise<ReviewVisit[]> {
  return withReadings(scope, await selectRows<ReviewVisitRow>(scope, VISIT + WAITING));
}

/** One visit; null for an unknown id, another team's, or one that was put away. */
export async function reviewVisit(scope: TeamScope, id: Buffer): Promise<ReviewVisit | null> {
  const rows = await selectRows<ReviewVisitRow>(scope, `${VISIT} AND v.id = :visit`, { visit: id });
  return (await withReadings(scope, rows))[0] ?? null;
}
