import { estimateDay } from '@/components/lab/estimate-day';
import { shownReading } from '@/components/lab/shown-reading';
import { localDate } from '@/lib/kit/local-date';
import { systemClock } from '@/lib/kit/system-clock';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { parseAsOf } from '@/lib/server/queries/as-of';
import { nestBrood } from '@/lib/server/queries/brood';
import { nestDetail } from '@/lib/server/queries/nest-detail';
import { nestTemperature } from '@/lib/server/queries/temperature/nest-temperature';
import { nestOutcome } from '@/lib/server/queries/nest-outcome';
import { readingDetail } from '@/lib/server/queries/reading-detail';
import { readingReview } from '@/lib/server/queries/reading-review';

/**
 * All that the page of a nest shows.
 *
 * @param asked the reading the person chose; the best of the latest visit when left out.
 */
export async function nestPageData(session: TeamContext, id: string, asked: string | undefined) {
  const nest = await nestDetail(session, id);
  const placed = shownReading(nest, asked);
  const nowMs = systemClock.now();
  const visitAt = placed ? Date.parse(placed.visit.startedAt) : null;
  const asOf = estimateDay({ visitAt, chosen: placed?.reading.id === asked, nowMs, zone: session.zone });
  const [brood, outcome, temperature, reading, review] = await Promise.all([
    nestBrood(session, nest.id, parseAsOf(asOf, session.zone, nowMs)),
    nestOutcome(session, nest.id),
    nestTemperature(session, nest.id),
    placed && readingDetail(session, placed.reading.id),
    placed && readingReview(session, placed.reading.id),
  ]);
  const shown = placed && reading && { reading, visitAt: placed.visit.startedAt };
  return {
    nest,
    shown,
    review,
    estimate: brood.estimate,
    asOf,
    today: localDate(nowMs, session.zone),
    outcome,
    temperature,
  };
}
