import 'server-only';
import type { Role } from '@/lib/server/auth/role';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { type SeenPlace, seenPlace } from '@/lib/server/policies/seen-place';
import type { NestRow, VisitRow } from '@/lib/server/queries/nest-rows';
import { instantText } from './instant-text';
import type { ReadingSummary } from './present-reading';

/** One nest of the list. */
export interface NestSummary {
  id: string;
  code: string;
  name: string | null;
  taxon: string | null;
  openedAt: string;
  visits: number;
  lastVisitAt: string | null;
  /** Cells of the census of the latest visit that was read; null without one, or while it must not be seen. */
  cells: number | null;
  state: string;
}

/** Answer of `GET /api/nests`. */
export interface NestList {
  nests: NestSummary[];
  total: number;
  page: number;
  pages: number;
}

/** One visit of a nest. */
export interface VisitAnswer {
  id: string;
  purpose: string;
  startedAt: string;
  readings: ReadingSummary[];
}

/** Answer of `GET /api/nests/<id>`. */
export interface NestAnswer {
  id: string;
  code: string;
  name: string | null;
  taxon: string | null;
  place: SeenPlace | null;
  visits: VisitAnswer[];
}

/** The place of a nest as a role may see it; null when none was recorded. */
export function presentPlace(role: Role, { lat, lon, accuracy_m }: NestRow): SeenPlace | null {
  return lat === null || lon === null ? null : seenPlace(role, { lat, lon, accuracyM: accuracy_m });
}

/** A nest in the list. */
export function presentNestSummary(
  { id, code, name, taxon, opened_at_text, opened_at }: NestRow,
  { visits, cells, state }: { visits: readonly VisitRow[]; cells: number | null; state: string },
): NestSummary {
  const last = visits.at(-1);
  return {
    id: fromBinary(id),
    code,
    name,
    taxon,
    openedAt: instantText(opened_at_text, opened_at),
    visits: visits.length,
    lastVisitAt: last ? instantText(last.started_at_text, last.started_at) : null,
    cells,
    state,
  };
}

/** A visit with its readings. */
export function presentVisit(
  { id, purpose, started_at_text, started_at }: VisitRow,
  readings: ReadingSummary[],
): VisitAnswer {
  return { id: fromBinary(id), purpose, startedAt: instantText(started_at_text, started_at), readings };
}

/** A nest with its visits. */
export function presentNest(role: Role, nest: NestRow, visits: VisitAnswer[]): NestAnswer {
  const { id, code, name, taxon } = nest;
  return { id: fromBinary(id), code, name, taxon, place: presentPlace(role, nest), visits };
}
