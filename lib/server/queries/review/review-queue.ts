import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { instantText } from '@/lib/server/presenters/instant-text';
import { type BlindVisits, blindVisits } from '@/lib/server/queries/blind-visits';
import { isLocked } from '@/lib/server/queries/census';
import { idKey } from '@/lib/server/queries/id-key';
import { type NameOf, memberNames } from '@/lib/server/queries/member-names';
import { type TeamScope, teamScope } from '@/lib/server/queries/team-scope';
import { type ClaimRow, reviewClaims } from './claims';
import { type Comparison, comparisons } from './comparison';
import { type ReaderCounts, readerCounts } from './reader-counts';
import { teamReviewSettings } from './review-settings';
import { type ReviewVisit, waitingVisits } from './review-visits';

/**
 * What a visit waits for: somebody to read it a second time, that reader to finish, a reviewer or the lead biologist
 * to settle it, somebody to lock it, or somebody to look at marks that came after the lock.
 */
export type WaitsFor = 'second' | 'reading' | 'reviewer' | 'lead' | 'lock' | 'later-marks';

/** One visit of the queue. It carries no number of any reading. */
export interface QueueItem {
  visit: string;
  nest: string;
  code: string;
  name: string | null;
  purpose: string;
  startedAt: string;
  /** When the field reading was handed in. */
  submittedAt: string;
  waitsFor: WaitsFor;
  /** Who is reading it a second time; null while nobody is. */
  reader: string | null;
  /** Is that the person who asks? */
  mine: boolean;
  /** Did the person who asks read it in the field, so that somebody else has to? */
  own: boolean;
  /** Field readings handed in of which none was chosen yet; 0 or 1 for most visits. */
  toChoose: number;
  overdue: boolean;
}

/** Answer of `GET /api/review`. */
export interface ReviewQueue {
  /** Oldest first. */
  waiting: QueueItem[];
  readers: ReaderCounts[];
  /** Days after which a reading is overdue. */
  overdueDays: number;
}

const DAY_MS = 86_400_000;

/** What stating an item needs beside the visit. */
interface QueueDesk {
  scope: TeamScope;
  blind: BlindVisits;
  claims: ReadonlyMap<string, ClaimRow>;
  compared: ReadonlyMap<string, Comparison>;
  nameOf: NameOf;
  overdueBefore: number;
}

function decided({ final, primary }: ReviewVisit, compared: QueueDesk['compared']): WaitsFor {
  if (final && isLocked(final)) return 'later-marks';
  const comparison = primary ? compared.get(idKey(primary.id)) : undefined;
  if (!comparison) return 'lock';
  return comparison.open.length === 0 && final ? 'lock' : comparison.settler;
}

function waitsFor(item: ReviewVisit, reader: Buffer | null, { scope, blind, compared }: QueueDesk): WaitsFor {
  // A second reader is told nothing about how far others agree.
  if (blind.has(idKey(item.visit.id))) return 'reading';
  if (item.second || item.final) return decided(item, compared);
  return reader && !reader.equals(scope.user) ? 'reading' : 'second';
}

/** Who is reading a visit a second time: the person who took it on, else whoever has begun. */
function readerOf({ visit, openSeconds, second }: ReviewVisit, claims: QueueDesk['claims']): Buffer | null {
  const claim = claims.get(idKey(visit.id));
  if (claim && !second?.opened_by.equals(claim.user_id)) return claim.user_id;
  return openSeconds[0]?.opened_by ?? null;
}

function queueItem(item: ReviewVisit, desk: QueueDesk): QueueItem {
  const { visit, fields, choice, primary } = item;
  const submitted = primary?.submitted_at ?? visit.startedAt;
  const reader = readerOf(item, desk.claims);
  return {
    visit: fromBinary(visit.id),
    nest: fromBinary(visit.nest),
    code: visit.code,
    name: visit.name,
    purpose: visit.purpose,
    startedAt: instantText(visit.startedAtText, visit.startedAt),
    submittedAt: submitted.toISOString(),
    waitsFor: waitsFor(item, reader, desk),
    reader: reader && desk.nameOf(reader),
    mine: reader?.equals(desk.scope.user) ?? false,
    own: fields.some(({ opened_by }) => opened_by.equals(desk.scope.user)),
    toChoose: fields.length > 1 && !choice ? fields.length : 0,
    overdue: submitted.getTime() < desk.overdueBefore,
  };
}

/** Pairs of readings that the person who asks may know about. */
function comparablePairs(items: readonly ReviewVisit[], blind: BlindVisits) {
  return items.flatMap(({ visit, primary, second, final }) =>
    primary && second && !blind.has(idKey(visit.id)) ? [{ field: primary, second, final }] : [],
  );
}

/**
 * `GET /api/review`: what waits in the lab, for whom, and since when. No number of any reading is in it, so a second
 * reader may look at it.
 *
 * @param nowMs epoch milliseconds.
 */
export async function reviewQueue(ctx: TeamContext, nowMs: number): Promise<ReviewQueue> {
  const scope = teamScope(ctx);
  const { values } = await teamReviewSettings(scope);
  const items = await waitingVisits(scope);
  const blind = await blindVisits(scope);
  const desk: QueueDesk = {
    scope,
    blind,
    claims: await reviewClaims(scope),
    compared: await comparisons(scope, comparablePairs(items, blind), values),
    nameOf: await memberNames(scope),
    overdueBefore: nowMs - values.reviewOverdue * DAY_MS,
  };
  const waiting = items
    .map((item) => queueItem(item, desk))
    .sort((a, b) => Date.parse(a.submittedAt) - Date.parse(b.submittedAt) || a.code.localeCompare(b.code));
  return { waiting, readers: await readerCounts(scope, desk.claims), overdueDays: values.reviewOverdue };
}
