import 'server-only';
import type { SettledCell } from '@/lib/brood/learning/confusion-learning';
import { isRecordedClass } from '@/lib/brood/team-settings/confusion-rows';
import { cellKey } from '@/lib/comb/axial';
import type { ReadCell } from '@/lib/comb/final-cells';
import { groupBy } from '@/lib/kit/group-by';
import { type BlindVisits, blindVisits, isHidden } from '@/lib/server/queries/blind-visits';
import { isLocked } from '@/lib/server/queries/census';
import { idKey } from '@/lib/server/queries/id-key';
import { readingCells } from '@/lib/server/queries/reading-cells';
import { type ReadingRow, readingsOfNests } from '@/lib/server/queries/reading-rows';
import type { TeamScope } from '@/lib/server/queries/team-scope';

/** A locked final reading with the readings it was settled from. */
interface DoubleReading {
  final: ReadingRow;
  readers: ReadingRow[];
}

/** The locked final reading of a visit that two people read, with both readings; null for any other visit. */
function doubleReading(readings: readonly ReadingRow[], scope: TeamScope, blind: BlindVisits): DoubleReading | null {
  const final = readings.find((reading) => reading.kind === 'final' && isLocked(reading));
  if (!final?.based_on || isHidden(final, scope, blind)) return null;
  const source = readings.find(({ id }) => final.based_on?.equals(id));
  const others = readings.filter(
    ({ kind, id, submitted_at }) => kind === 'second' && submitted_at && !source?.id.equals(id),
  );
  return source && others.length > 0 ? { final, readers: [source, ...others] } : null;
}

/** The cells of a final reading as one reader had recorded them; unsure marks and cells not read are left out. */
function pairs(final: readonly ReadCell[], reader: readonly ReadCell[]): SettledCell[] {
  const seenAt = new Map(reader.map((cell) => [cellKey(cell), cell]));
  return final.flatMap((cell) => {
    const seen = seenAt.get(cellKey(cell));
    if (!seen || seen.unsure || !isRecordedClass(cell.state) || !isRecordedClass(seen.state)) return [];
    return [{ truth: cell.state, instar: cell.instar ?? null, seen: seen.state }];
  });
}

/** Every cell that two people read and the lab settled, once for each reader. */
export async function settledCells(scope: TeamScope, nests: readonly Buffer[]): Promise<SettledCell[]> {
  const blind = await blindVisits(scope);
  const byVisit = groupBy(await readingsOfNests(scope, nests), (reading) => idKey(reading.visit_id));
  const doubles = [...byVisit.values()].flatMap((readings) => doubleReading(readings, scope, blind) ?? []);
  const cells = await readingCells(
    scope,
    doubles.flatMap(({ final, readers }) => [final, ...readers]),
    'locked',
  );
  const cellsOf = ({ id }: ReadingRow) => cells.get(idKey(id)) ?? [];
  return doubles.flatMap(({ final, readers }) => readers.flatMap((reader) => pairs(cellsOf(final), cellsOf(reader))));
}
