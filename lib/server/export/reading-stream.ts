import 'server-only';
import type { ReadCell } from '@/lib/comb/final-cells';
import type { ReadingKey } from '@/lib/csv/shared-columns';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { blindVisits, isHidden } from '@/lib/server/queries/blind-visits';
import { idKey } from '@/lib/server/queries/id-key';
import { lockedVersions } from '@/lib/server/queries/locked-versions';
import { memberNames } from '@/lib/server/queries/member-names';
import { readingCells } from '@/lib/server/queries/reading-cells';
import type { ReadingRow } from '@/lib/server/queries/reading-rows';
import type { ExportCall } from './export-call';
import { type ExportVisit, visitPages } from './visit-pages';

/** One reading of a download. */
export interface ExportReading {
  key: ReadingKey;
  taxon: string | null;
  lockedVersion: number | null;
  /** In walk order. */
  cells: ReadCell[];
}

/** Readings whose marks are held in memory at once. */
const CHUNK = 40;

/** One reading with what its rows say about its nest and visit. */
interface Listed extends ExportVisit {
  reading: ReadingRow;
}

function* chunksOf<Item>(items: readonly Item[]): Generator<Item[]> {
  for (let start = 0; start < items.length; start += CHUNK) yield items.slice(start, start + CHUNK);
}

function keyOf(team: string, { nest, visit, visitDate, reading }: Listed, observer: string): ReadingKey {
  return {
    team,
    nest: nest.code,
    visit: fromBinary(visit.id),
    visitDate,
    reading: fromBinary(reading.id),
    readingKind: reading.kind,
    observer,
  };
}

/**
 * The readings of a download with their cells, in the order of every file. A final reading shows its locked version
 * where it has one. Readings kept from the person who asks are left out.
 */
export async function* readingStream(call: ExportCall): AsyncGenerator<ExportReading> {
  const { ctx, scope } = call;
  const blind = await blindVisits(scope);
  const nameOf = await memberNames(scope);
  for await (const visits of visitPages(call)) {
    const locked = lockedVersions(visits.flatMap((visit) => visit.readings));
    const listed = visits.flatMap((visit) => visit.readings.map((reading) => ({ ...visit, reading })));
    for (const chunk of chunksOf(listed.filter(({ reading }) => !isHidden(reading, scope, blind)))) {
      const cells = await readingCells(
        scope,
        chunk.map(({ reading }) => reading),
        'locked',
      );
      for (const item of chunk) {
        const id = idKey(item.reading.id);
        yield {
          key: keyOf(ctx.teamName, item, nameOf(item.reading.opened_by)),
          taxon: item.nest.taxon,
          lockedVersion: locked.get(id) ?? null,
          cells: cells.get(id) ?? [],
        };
      }
    }
  }
}
