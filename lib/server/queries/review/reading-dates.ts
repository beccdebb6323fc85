import 'server-only';
import { estimateNest } from '@/lib/brood/estimate-nest';
import { type LayingDifference, type NestDates, layingDifference, nestDates } from '@/lib/brood/laying-difference';
import type { ReadCell } from '@/lib/comb/final-cells';
import { addDays, localDate } from '@/lib/kit/local-date';
import { startOfLocalDay } from '@/lib/kit/start-of-local-day';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { teamBroodSettings } from '@/lib/server/queries/brood-settings';
import { teamScope } from '@/lib/server/queries/team-scope';
import type { Comparison } from './comparison';
import type { ReviewVisit } from './review-visits';

/** What the two readings say about time. */
export interface ReadingDates extends LayingDifference {
  field: NestDates;
  lab: NestDates;
}

/**
 * The dates that each of two readings would give by itself. Other visits are left out, so that what differs comes from
 * the readers alone.
 */
export async function readingDates(
  ctx: TeamContext,
  { visit }: ReviewVisit,
  { field, lab }: Comparison,
): Promise<ReadingDates> {
  const { settings } = await teamBroodSettings(teamScope(ctx));
  const at = visit.startedAt.getTime();
  const asOf = startOfLocalDay(addDays(localDate(at, ctx.zone), 1), ctx.zone) - 1;
  const estimate = (id: string, marks: readonly ReadCell[]) =>
    estimateNest({
      nest: fromBinary(visit.nest),
      zone: ctx.zone,
      asOf,
      readings: [{ id, at, marks }],
      taxon: visit.taxon,
      settings,
    });
  const [one, other] = [estimate('field', field), estimate('lab', lab)];
  return { ...layingDifference(one, other), field: nestDates(one), lab: nestDates(other) };
}
