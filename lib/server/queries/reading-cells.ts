import 'server-only';
import type { InferAttributes } from 'sequelize';
import { type CellSettlement, type ReadCell, finalCells, markedCells } from '@/lib/comb/final-cells';
import { isSettlePick } from '@/lib/comb/settle-pick';
import { groupBy } from '@/lib/kit/group-by';
import { fromBinaryOrNull } from '@/lib/server/db/uuid-binary';
import type { Settlement } from '@/models/settlement';
import { idKey } from './id-key';
import { type MarkHistory, liveUpTo, markHistories, storedState } from './mark-history';
import type { ReadingRow } from './reading-rows';
import type { TeamScope } from './team-scope';

/** A settlement as stored. */
export type SettlementRow = InferAttributes<Settlement>;

/**
 * Which decisions a final reading shows: all of them, or, where a version is locked, those up to that version, so
 * that what leaves the house is exactly what was locked while an amendment is still being worked on.
 */
export type ShownVersion = 'current' | 'locked';

/** The reading whose marks a reading is made of: itself, or the one a final reading is based on. */
export function sourceId(reading: ReadingRow): Buffer {
  return reading.based_on ?? reading.id;
}

/** The settlements of some final readings in the order they were decided. */
export async function settlementsOf(scope: TeamScope, finals: readonly Buffer[]): Promise<SettlementRow[]> {
  if (finals.length === 0) return [];
  return scope.db.models.Settlement.findAll({
    where: { team_id: scope.team, reading_id: [...finals] },
    order: [
      ['reading_id', 'ASC'],
      ['position', 'ASC'],
    ],
    raw: true,
    transaction: scope.transaction,
  });
}

function cellSettlement({ q, r, state, position, mark_op_id, pick }: SettlementRow): CellSettlement {
  const taken = isSettlePick(pick) ? pick : null;
  return { q, r, state: storedState(state), position, markOpId: fromBinaryOrNull(mark_op_id), pick: taken };
}

/** The cells of one reading from the history of its source. */
function cellsOf(reading: ReadingRow, history: MarkHistory, decisions: readonly SettlementRow[]): ReadCell[] {
  const live = liveUpTo(history, reading.base_seq);
  return reading.kind === 'final' ? finalCells(live, decisions.map(cellSettlement)) : markedCells(live);
}

/**
 * The cells of readings as they stand, in walk order, by `idKey` of the reading: live marks of a field or second
 * reading; of a final one the marks it was made from, overlaid by settlements.
 */
export async function readingCells(
  scope: TeamScope,
  readings: readonly ReadingRow[],
  shown: ShownVersion = 'current',
): Promise<Map<string, ReadCell[]>> {
  const sources = new Map(readings.map((reading) => [idKey(sourceId(reading)), sourceId(reading)]));
  const histories = await markHistories(scope, [...sources.values()]);
  const finals = readings.filter((reading) => reading.kind === 'final');
  const decided = groupBy(
    await settlementsOf(
      scope,
      finals.map((reading) => reading.id),
    ),
    (row) => idKey(row.reading_id),
  );
  const cells = new Map<string, ReadCell[]>();
  for (const reading of readings) {
    const last = shown === 'locked' ? (reading.locked_version ?? Infinity) : Infinity;
    const decisions = (decided.get(idKey(reading.id)) ?? []).filter((row) => row.version <= last);
    const history = histories.get(idKey(sourceId(reading))) ?? { marks: [], retractions: [] };
    cells.set(idKey(reading.id), cellsOf(reading, history, decisions));
  }
  return cells;
}
