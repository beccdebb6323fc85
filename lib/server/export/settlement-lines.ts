import 'server-only';
import { cellKey } from '@/lib/comb/axial';
import type { ReadCell } from '@/lib/comb/final-cells';
import { cellNumber } from '@/lib/comb/walk';
import { SETTLEMENTS_FILE } from '@/lib/csv/settlements-file';
import { writeHeader, writeRow } from '@/lib/csv/write-row';
import { fromBinary, fromBinaryOrNull } from '@/lib/server/db/uuid-binary';
import { memberNames } from '@/lib/server/queries/member-names';
import { settlementsOf } from '@/lib/server/queries/reading-cells';
import type { ExportCall } from './export-call';
import { type SeenVisit, seenVisits } from './pair-stream';

function stateAt(cells: readonly ReadCell[]): (cell: { q: number; r: number }) => string | null {
  const states = new Map(cells.map((cell) => [cellKey(cell), cell.state]));
  return (cell) => states.get(cellKey(cell)) ?? null;
}

/** The first lab reading of a visit that was handed in. */
function labReading({ readings }: SeenVisit) {
  return readings.find(({ kind, submitted_at }) => kind === 'second' && submitted_at !== null);
}

/** `settlements.csv`, line by line. Of a locked reading, exactly the decisions that were locked. */
export async function* settlementLines(call: ExportCall): AsyncGenerator<string> {
  yield writeHeader(SETTLEMENTS_FILE, call.form);
  const nameOf = await memberNames(call.scope);
  for await (const seen of seenVisits(call)) {
    const key = {
      team: call.ctx.teamName,
      nest: seen.nest.code,
      visit: fromBinary(seen.visit.id),
      visitDate: seen.visitDate,
    };
    const lab = labReading(seen);
    const labState = stateAt(lab ? seen.cellsOf(lab.id) : []);
    for (const final of seen.readings.filter(({ kind }) => kind === 'final')) {
      const source = final.based_on ?? final.id;
      const fieldState = stateAt(seen.cellsOf(source));
      const lockedVersion = final.locked_version;
      for (const row of await settlementsOf(call.scope, [final.id])) {
        if (row.version > (lockedVersion ?? Infinity)) continue;
        const { q, r, state, reason, version } = row;
        yield writeRow(
          SETTLEMENTS_FILE,
          {
            ...key,
            reading: fromBinary(final.id),
            source: fromBinary(source),
            cell: cellNumber({ q, r }),
            q,
            r,
            fieldState: fieldState(row),
            labState: labState(row),
            state,
            reason,
            settledBy: nameOf(row.actor_id),
            settledAt: row.created_at.toISOString(),
            version,
            settledFrom: fromBinaryOrNull(row.mark_op_id),
            lockedVersion,
          },
          call.form,
        );
      }
    }
  }
}
