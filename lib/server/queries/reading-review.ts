import 'server-only';
import { Op } from 'sequelize';
import type { CellState } from '@/lib/comb/states';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary, fromBinaryOrNull } from '@/lib/server/db/uuid-binary';
import { type Amendment, amendmentsOf } from './amendments';
import { storedState } from './mark-history';
import { type NameOf, memberNames } from './member-names';
import { type SettlementRow, settlementsOf, sourceId } from './reading-cells';
import { visibleReading } from './reading-detail';
import { type ReadingRow, finalOf } from './reading-rows';
import { type TeamScope, teamScope } from './team-scope';

/** Where the final reading stands. */
export interface FinalStanding {
  id: string;
  /** The reading it was made from. */
  basedOn: string;
  version: number;
  /** The version last locked; the reading is locked when it equals `version`. */
  lockedVersion: number | null;
  /** Marks or retractions came to the source after the final reading was made from it. */
  stale: boolean;
}

/** One decision of a reviewer about one cell. */
export interface SettlementAnswer {
  q: number;
  r: number;
  state: CellState;
  reason: string;
  /** Display name. */
  actor: string;
  /** ISO 8601 UTC. */
  at: string;
  version: number;
  /** The mark it replaced. */
  settledFrom: string | null;
}

/** What the lab decided about a reading: more than the contract's answers say, for the lab's own pages. */
export interface ReadingReview {
  /** Null before the first decision. */
  final: FinalStanding | null;
  /** Every decision about a cell in the order they were made, replaced ones included. */
  settlements: SettlementAnswer[];
  /** Why each version after the first was opened. */
  amendments: Amendment[];
}

/** Did anything come to the source after the place in the log that the final reading stands on? Nothing moves by it. */
export async function isStale({ team, db, transaction }: TeamScope, final: ReadingRow): Promise<boolean> {
  const later = { team_id: team, reading_id: sourceId(final), seq: { [Op.gt]: final.base_seq ?? 0 } };
  const marks = await db.models.Mark.count({ where: later, transaction });
  return marks > 0 || (await db.models.Retraction.count({ where: later, transaction })) > 0;
}

async function standingOf(scope: TeamScope, final: ReadingRow): Promise<FinalStanding> {
  return {
    id: fromBinary(final.id),
    basedOn: fromBinary(sourceId(final)),
    version: final.version ?? 1,
    lockedVersion: final.locked_version,
    stale: await isStale(scope, final),
  };
}

function presentSettlement(row: SettlementRow, nameOf: NameOf): SettlementAnswer {
  const { q, r, reason, version } = row;
  const who = { actor: nameOf(row.actor_id), at: row.created_at.toISOString() };
  return {
    q,
    r,
    state: storedState(row.state),
    reason,
    ...who,
    version,
    settledFrom: fromBinaryOrNull(row.mark_op_id),
  };
}

/**
 * What the lab decided about a reading, asked for by its id or by that of its final reading.
 *
 * @throws HttpProblem `not-found`, or `blind` while the person has an own second reading open at this visit.
 */
export async function readingReview(ctx: TeamContext, id: string): Promise<ReadingReview> {
  const scope = teamScope(ctx);
  const reading = await visibleReading(scope, id);
  const final = reading.kind === 'final' ? reading : await finalOf(scope, reading.id);
  if (!final) return { final: null, settlements: [], amendments: [] };
  const nameOf = await memberNames(scope);
  const rows = await settlementsOf(scope, [final.id]);
  return {
    final: await standingOf(scope, final),
    settlements: rows.map((row) => presentSettlement(row, nameOf)),
    amendments: await amendmentsOf(scope, final.id, nameOf),
  };
}
