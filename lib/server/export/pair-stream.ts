import 'server-only';
import type { ReadCell } from '@/lib/comb/final-cells';
import { blindVisits } from '@/lib/server/queries/blind-visits';
import { idKey } from '@/lib/server/queries/id-key';
import { readingCells } from '@/lib/server/queries/reading-cells';
import { type ReadingPair, pairsOfVisit } from '@/lib/server/queries/reading-pairs';
import type { ExportCall } from './export-call';
import { type ExportVisit, visitPages } from './visit-pages';

/** A visit that may be compared or settled, with the cells of its readings at hand. */
export interface SeenVisit extends ExportVisit {
  pairs: ReadingPair[];
  /** Cells of a reading by its id; of a final one as locked. */
  cellsOf(reading: Buffer): ReadCell[];
}

/**
 * The visits of a download with the cells of their readings, leaving out those at which the person who asks has an
 * own second reading open: what others read there, and how far they agree, would give it away.
 */
export async function* seenVisits(call: ExportCall): AsyncGenerator<SeenVisit> {
  const blind = await blindVisits(call.scope);
  for await (const visits of visitPages(call)) {
    for (const visit of visits) {
      if (visit.readings.length < 2 || blind.has(idKey(visit.visit.id))) continue;
      const cells = await readingCells(call.scope, visit.readings, 'locked');
      const cellsOf = (reading: Buffer) => cells.get(idKey(reading)) ?? [];
      yield { ...visit, pairs: pairsOfVisit(visit.readings), cellsOf };
    }
  }
}
