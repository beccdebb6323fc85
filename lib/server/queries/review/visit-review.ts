import 'server-only';
import type { CombAgreement, Settler } from '@/lib/comb/agreement';
import { cellKey } from '@/lib/comb/axial';
import type { CellPair } from '@/lib/comb/compare-cells';
import type { ReadCell } from '@/lib/comb/final-cells';
import { READING_SCALE } from '@/lib/comb/reading-scale';
import type { ReviewSettings } from '@/lib/comb/review-settings';
import { type SettlePick, isSettlePick } from '@/lib/comb/settle-pick';
import { type SettleSuggestion, settleSuggestion } from '@/lib/comb/settle-suggestion';
import type { CellState } from '@/lib/comb/states';
import { isUuidText } from '@/lib/kit/uuid';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { instantText } from '@/lib/server/presenters/instant-text';
import { type Amendment, amendmentsOf } from '@/lib/server/queries/amendments';
import { blindVisits } from '@/lib/server/queries/blind-visits';
import { idKey } from '@/lib/server/queries/id-key';
import { storedState } from '@/lib/server/queries/mark-history';
import { type NameOf, memberNames } from '@/lib/server/queries/member-names';
import { type SettlementRow, readingCells } from '@/lib/server/queries/reading-cells';
import { isStale } from '@/lib/server/queries/reading-review';
import type { ReadingRow } from '@/lib/server/queries/reading-rows';
import { type TeamScope, teamScope } from '@/lib/server/queries/team-scope';
import { type ReadingAgreement, agreementOf } from '@/lib/stats/agreement-of';
import { type Comparison, comparisonOf } from './comparison';
import { type ReadingDates, readingDates } from './reading-dates';
import { type LockAnswer, locksOf } from './reading-locks';
import { teamReviewSettings } from './review-settings';
import { type ReviewVisit, reviewVisit } from './review-visits';

/** One reading of the visit, without its cells. */
export interface ReviewReading {
  id: string;
  observer: string;
  /** `phone`, `paper` or `photo`. */
  source: string;
  openedAt: string;
  submittedAt: string;
}

/** A decision that stands in one cell. */
export interface SettledView {
  state: CellState;
  /** Null for a correction made without a second reading. */
  pick: SettlePick | null;
  reason: string;
  actor: string;
  /** ISO 8601 UTC. */
  at: string;
}

/** One cell as both readers saw it, what is proposed, and what was decided. */
export interface PairView extends CellPair {
  suggestion: SettleSuggestion | null;
  settled: SettledView | null;
}

/** Two readings compared. */
export interface ComparisonView {
  field: ReadCell[];
  lab: ReadCell[];
  /** In walk order. */
  pairs: PairView[];
  agreement: CombAgreement;
  figures: ReadingAgreement<CellState>;
  settler: Settler;
  dates: ReadingDates;
  /** Cells still to be decided. */
  open: number;
}

/** Where the final reading stands. */
export interface FinalView {
  id: string;
  version: number;
  lockedVersion: number | null;
  stale: boolean;
  cells: ReadCell[];
  /** Number of the last decision. */
  decisions: number;
  locks: LockAnswer[];
  amendments: Amendment[];
}

/** Everything the lab knows about one visit's readings. */
export interface VisitReview {
  visit: { id: string; purpose: string; startedAt: string };
  nest: { id: string; code: string; name: string | null; taxon: string | null };
  /** Field readings handed in. */
  fields: ReviewReading[];
  /** The one that counts; null before any was handed in. */
  primary: string | null;
  choice: { reason: string; actor: string; at: string } | null;
  second: ReviewReading | null;
  final: FinalView | null;
  settings: { version: number; values: ReviewSettings };
  /** Null until there are two readings. */
  comparison: ComparisonView | null;
}

function readingView(row: ReadingRow, nameOf: NameOf): ReviewReading {
  return {
    id: fromBinary(row.id),
    observer: nameOf(row.opened_by),
    source: row.source,
    openedAt: instantText(row.opened_at_text, row.opened_at),
    submittedAt: (row.submitted_at ?? row.opened_at).toISOString(),
  };
}

function settledView({ state, pick, reason, actor_id, created_at }: SettlementRow, nameOf: NameOf): SettledView {
  const taken = isSettlePick(pick) ? pick : null;
  return { state: storedState(state), pick: taken, reason, actor: nameOf(actor_id), at: created_at.toISOString() };
}

function pairView(pair: CellPair, { settled }: Comparison, nameOf: NameOf): PairView {
  const decision = settled.get(cellKey(pair));
  return { ...pair, suggestion: settleSuggestion(pair), settled: decision ? settledView(decision, nameOf) : null };
}

async function comparisonView(ctx: TeamContext, item: ReviewVisit, { values }: VisitReview['settings']) {
  const { primary, second, final } = item;
  if (!primary || !second) return null;
  const scope = teamScope(ctx);
  const nameOf = await memberNames(scope);
  const comparison = await comparisonOf(scope, { field: primary, second, final }, values);
  const { field, lab, pairs, agreement, settler, open } = comparison;
  const view: ComparisonView = {
    field,
    lab,
    pairs: pairs.map((pair) => pairView(pair, comparison, nameOf)),
    agreement,
    figures: agreementOf(field, lab, READING_SCALE),
    settler,
    dates: await readingDates(ctx, item, comparison),
    open: open.length,
  };
  return view;
}

async function finalView(scope: TeamScope, final: ReadingRow, nameOf: NameOf): Promise<FinalView> {
  const cells = (await readingCells(scope, [final])).get(idKey(final.id)) ?? [];
  const decisions = await scope.db.models.Settlement.max('position', {
    where: { team_id: scope.team, reading_id: final.id },
  });
  return {
    id: fromBinary(final.id),
    version: final.version ?? 1,
    lockedVersion: final.locked_version,
    stale: await isStale(scope, final),
    cells,
    decisions: Number(decisions ?? 0),
    locks: await locksOf(scope, final.id, nameOf),
    amendments: await amendmentsOf(scope, final.id, nameOf),
  };
}

/** The visit of an address, unless the person still has to read it a second time. */
async function visibleVisit(scope: TeamScope, id: string): Promise<ReviewVisit> {
  const item = isUuidText(id) ? await reviewVisit(scope, toBinary(id)) : null;
  if (!item) throw new HttpProblem('not-found');
  if ((await blindVisits(scope)).has(idKey(item.visit.id))) throw new HttpProblem('blind');
  return item;
}

function choiceView({ choice }: ReviewVisit, nameOf: NameOf): VisitReview['choice'] {
  return choice && { reason: choice.reason, actor: nameOf(choice.actor_id), at: choice.chosen_at.toISOString() };
}

/**
 * Both readings of a visit, what they have in common, and what the lab has decided.
 *
 * @param id of the visit, as it stands in the address.
 * @throws HttpProblem `not-found`, or `blind` while the person has taken on, or is making, a second reading of it.
 */
export async function visitReview(ctx: TeamContext, id: string): Promise<VisitReview> {
  const scope = teamScope(ctx);
  const item = await visibleVisit(scope, id);
  const nameOf = await memberNames(scope);
  const settings = await teamReviewSettings(scope);
  const { visit, fields, primary, second, final } = item;
  return {
    visit: { id, purpose: visit.purpose, startedAt: instantText(visit.startedAtText, visit.startedAt) },
    nest: { id: fromBinary(visit.nest), code: visit.code, name: visit.name, taxon: visit.taxon },
    fields: fields.map((row) => readingView(row, nameOf)),
    primary: primary && fromBinary(primary.id),
    choice: choiceView(item, nameOf),
    second: second && readingView(second, nameOf),
    final: final && (await finalView(scope, final, nameOf)),
    settings,
    comparison: await comparisonView(ctx, item, settings),
  };
}
