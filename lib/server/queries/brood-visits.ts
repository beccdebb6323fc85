import 'server-only';
import type { BroodReading } from '@/lib/brood/input';
import { type EventCounts, countHits, whatHappened } from '@/lib/brood/what-happened';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { broodReadings, nestBrood } from './brood';
import { nestById } from './nest-rows';
import { teamScope } from './team-scope';

/** How the ranges given at one visit stand to what was seen later. */
export interface VisitHits {
  /** The reading that speaks for the visit. */
  reading: string;
  counts: EventCounts[];
}

/** At most so many of the latest visits are looked back to: each costs an estimate. */
export const MOST_CHECKED = 10;

/**
 * The readings an estimate of a nest is made from, one a visit; those kept from the person who asks are left out.
 *
 * @throws HttpProblem `not-found` for an unknown nest or another team's.
 */
export async function nestBroodReadings(ctx: TeamContext, id: string): Promise<BroodReading[]> {
  const scope = teamScope(ctx);
  const nest = await nestById(scope, id);
  return broodReadings(scope, nest.id);
}

/**
 * Holds the ranges of earlier visits against later readings, the earliest visit first. Every visit but the last is
 * estimated as it was known then; other requests are let through in between.
 */
export async function nestBroodHits(
  ctx: TeamContext,
  id: string,
  readings: readonly BroodReading[],
): Promise<VisitHits[]> {
  const earlier = [...readings].sort((a, b) => a.at - b.at).slice(0, -1);
  const hits: VisitHits[] = [];
  for (const { id: reading, at } of earlier.slice(-MOST_CHECKED)) {
    const { estimate } = await nestBrood(ctx, id, at);
    hits.push({ reading, counts: countHits(whatHappened(estimate, readings)) });
  }
  return hits;
}
