import 'server-only';
import { groupBy } from '@/lib/kit/group-by';
import { localDate } from '@/lib/kit/local-date';
import { idKey } from '@/lib/server/queries/id-key';
import { type InstantRange, instantRange } from '@/lib/server/queries/local-date-range';
import { type NestRow, type VisitRow, visitsOfNests } from '@/lib/server/queries/nest-rows';
import { type ReadingRow, readingsOfNests } from '@/lib/server/queries/reading-rows';
import type { ExportCall } from './export-call';
import { nestPages } from './nest-pages';

/** One visit of a download with its nest and readings. */
export interface ExportVisit {
  nest: NestRow;
  visit: VisitRow;
  /** Local date of the visit at the nest. */
  visitDate: string;
  /** In the order they were opened. */
  readings: ReadingRow[];
}

function isWithin({ started_at }: VisitRow, { from, before }: InstantRange): boolean {
  return (!from || started_at >= from) && (!before || started_at < before);
}

/** The visits of a download with their readings, a page of nests at a time: by nest, then by start, then by id. */
export async function* visitPages(call: ExportCall): AsyncGenerator<ExportVisit[]> {
  const range = instantRange(call.filter, call.ctx.zone);
  for await (const nests of nestPages(call)) {
    const ids = nests.map((nest) => nest.id);
    const visits = groupBy(await visitsOfNests(call.scope, ids), (visit) => idKey(visit.nest_id));
    const readings = groupBy(await readingsOfNests(call.scope, ids), (reading) => idKey(reading.visit_id));
    yield nests.flatMap((nest) =>
      (visits.get(idKey(nest.id)) ?? [])
        .filter((visit) => isWithin(visit, range))
        .map((visit) => ({
          nest,
          visit,
          visitDate: localDate(visit.started_at.getTime(), call.ctx.zone),
          readings: readings.get(idKey(visit.id)) ?? [],
        })),
    );
  }
}
