import 'server-only';
import { cellKey } from '@/lib/comb/axial';
import { type CombAgreement, type Settler, countAgreement, settlerOf } from '@/lib/comb/agreement';
import { type CellPair, compareCells } from '@/lib/comb/compare-cells';
import type { ReadCell } from '@/lib/comb/final-cells';
import type { ReviewSettings } from '@/lib/comb/review-settings';
import { idKey } from '@/lib/server/queries/id-key';
import { type SettlementRow, readingCells, settlementsOf } from '@/lib/server/queries/reading-cells';
import type { ReadingRow } from '@/lib/server/queries/reading-rows';
import type { TeamScope } from '@/lib/server/queries/team-scope';

/** A field and a second reading of one visit, and the final one made from the field reading. */
export interface ReadingPair {
  field: ReadingRow;
  second: ReadingRow;
  final: ReadingRow | null;
}

/** Two readings laid over each other, with what was decided since. */
export interface Comparison {
  field: ReadCell[];
  lab: ReadCell[];
  pairs: CellPair[];
  agreement: CombAgreement;
  settler: Settler;
  /** The decision that stands in a cell, by cell key. */
  settled: ReadonlyMap<string, SettlementRow>;
  /** Cells that still need a decision. */
  open: CellPair[];
}

/** The row whose cells are compared: the field reading as the final one was made from it, or as it stands. */
function fieldAsJudged({ field, final }: ReadingPair): ReadingRow {
  return { ...field, base_seq: final?.base_seq ?? null };
}

/** Compares pairs of readings, by `idKey` of the field reading. All of them cost the same four queries. */
export async function comparisons(
  scope: TeamScope,
  readingPairs: readonly ReadingPair[],
  settings: ReviewSettings,
): Promise<Map<string, Comparison>> {
  const rows = readingPairs.flatMap((pair) => [fieldAsJudged(pair), pair.second]);
  const cells = await readingCells(scope, rows);
  const finals = readingPairs.flatMap(({ final }) => final?.id ?? []);
  const decisions = await settlementsOf(scope, finals);
  return new Map(
    readingPairs.map((pair) => {
      const field = cells.get(idKey(pair.field.id)) ?? [];
      const lab = cells.get(idKey(pair.second.id)) ?? [];
      const pairs = compareCells(field, lab);
      const agreement = countAgreement(pairs);
      const own = decisions.filter(({ reading_id }) => pair.final !== null && reading_id.equals(pair.final.id));
      const settled = new Map(own.map((row) => [cellKey(row), row]));
      const open = pairs.filter((place) => place.open && !settled.has(cellKey(place)));
      return [
        idKey(pair.field.id),
        { field, lab, pairs, agreement, settler: settlerOf(agreement, settings), settled, open },
      ];
    }),
  );
}

/** Compares one pair of readings. */
export async function comparisonOf(scope: TeamScope, pair: ReadingPair, settings: ReviewSettings): Promise<Comparison> {
  const found = (await comparisons(scope, [pair], settings)).get(idKey(pair.field.id));
  if (!found) throw new Error('a comparison was asked for and not made');
  return found;
}
