import { type BroodStop, broodStops } from '@/components/lab/brood/brood-stops';
import { systemClock } from '@/lib/kit/system-clock';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { parseAsOf } from '@/lib/server/queries/as-of';
import { nestBrood } from '@/lib/server/queries/brood';
import { nestBroodReadings } from '@/lib/server/queries/brood-visits';
import { nestDetail } from '@/lib/server/queries/nest-detail';

/** The stop asked for, or the latest. */
function chosen(stops: readonly BroodStop[], asked: string | undefined): number {
  const found = stops.findIndex(({ key }) => key === asked);
  return found === -1 ? stops.length - 1 : found;
}

/**
 * All that the brood page shows, but for the look back over visits.
 *
 * @param asked the visit whose knowledge is asked for; the latest when left out.
 */
export async function broodPageData(session: TeamContext, id: string, asked: string | undefined) {
  const [nest, readings] = await Promise.all([nestDetail(session, id), nestBroodReadings(session, id)]);
  const nowMs = systemClock.now();
  const stops = broodStops({ nest, readings, nowMs, zone: session.zone });
  const at = chosen(stops, asked);
  const stop = stops[at];
  if (!stop) return { nest, readings, stops, shown: null };
  const asOf = stop.asOf ?? parseAsOf(undefined, session.zone, nowMs);
  const { estimate } = await nestBrood(session, nest.id, asOf);
  return { nest, readings, stops, shown: { at, stop, estimate } };
}
