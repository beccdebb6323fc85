import 'server-only';
import { cellKey } from '@/lib/comb/axial';
import { type LearningSummary, learningNotes } from '@/lib/comb/learning-notes';
import { groupBy } from '@/lib/kit/group-by';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { may } from '@/lib/server/policies/may';
import { type ReaderTrend, type StateTrend, readerTrends, stateTrends } from './agreement-trends';
import { type ComparedPair, type LockedPair, comparedSeason } from './compared-visits';
import { idKey } from './id-key';
import { type NameOf, memberNames } from './member-names';
import { seasonYears } from './season-years';
import { teamScope } from './team-scope';

/** What one person's locked readings of a year teach. */
export interface PersonNotes extends LearningSummary {
  key: string;
  name: string;
  /** Is it about the person who asks? */
  own: boolean;
  readings: number;
}

/** What the page about agreement shows. */
export interface AgreementReport {
  year: string;
  /** Newest first. */
  years: string[];
  readers: ReaderTrend[];
  states: StateTrend[];
  notes: PersonNotes[];
}

function cellsOf({ sourceCells, finalCells }: LockedPair) {
  const settled = new Map(finalCells.map((cell) => [cellKey(cell), cell.state]));
  return sourceCells.map((cell) => ({ read: cell.state, settled: settled.get(cellKey(cell)) ?? ('unread' as const) }));
}

/** Notes for those who read at the nest: the person who asks, and for the lead biologist everybody. */
function notesFor(ctx: TeamContext, { locked, nameOf, user }: { locked: LockedPair[]; nameOf: NameOf; user: Buffer }) {
  const readAtNest = locked.filter(({ source }) => source.kind === 'field');
  const byPerson = groupBy(readAtNest, ({ source }) => idKey(source.opened_by));
  const seesAll = may(ctx.role, 'notes.everyone');
  return [...byPerson].flatMap(([key, pairs]): PersonNotes[] => {
    const [first] = pairs;
    const own = key === idKey(user);
    if (!first || !(own || seesAll)) return [];
    const summary = learningNotes(pairs.flatMap(cellsOf));
    return [{ key, name: nameOf(first.source.opened_by), own, readings: pairs.length, ...summary }];
  });
}

/** Who may not see everybody's figures sees the comparisons their own readings are part of. */
function visiblePairs(ctx: TeamContext, pairs: ComparedPair[], user: Buffer): ComparedPair[] {
  if (may(ctx.role, 'agreement.everyone')) return pairs;
  return pairs.filter(({ comparison, first }) => comparison === 'field-lab' && first.opened_by.equals(user));
}

/**
 * Agreement of a season: by reader, by state, and what those who read can learn from it. A technician sees her own
 * figures and notes; other people's notes only the lead biologist.
 *
 * @param year as it stands in the address; the newest one when it is none of the team's.
 * @param nowMs epoch milliseconds.
 */
export async function agreementReport(
  ctx: TeamContext,
  year: string | undefined,
  nowMs: number,
): Promise<AgreementReport> {
  const scope = teamScope(ctx);
  const years = await seasonYears(scope, ctx.zone, nowMs);
  const shown = years.find((known) => known === year) ?? years[0] ?? '';
  const { pairs, locked } = await comparedSeason(scope, ctx.zone, shown);
  const nameOf = await memberNames(scope);
  const visible = visiblePairs(ctx, pairs, scope.user);
  return {
    year: shown,
    years,
    readers: readerTrends(visible, nameOf),
    states: stateTrends(visible),
    notes: notesFor(ctx, { locked, nameOf, user: scope.user }),
  };
}
