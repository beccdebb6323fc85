import 'server-only';
import { localDate } from '@/lib/kit/local-date';
import { selectRows } from './select-rows';
import type { TeamScope } from './team-scope';

/** The years (local to the team) in which a nest was visited, newest first; this year when there was no visit. */
export async function seasonYears(scope: TeamScope, zone: string, nowMs: number): Promise<string[]> {
  const [found] = await selectRows<{ first: Date | null; last: Date | null }>(
    scope,
    'SELECT MIN(started_at) AS first, MAX(started_at) AS last FROM visits WHERE team_id = :team',
  );
  const year = (instant: Date | null | undefined) => Number(localDate(instant?.getTime() ?? nowMs, zone).slice(0, 4));
  const [from, to] = [year(found?.first), year(found?.last)];
  return Array.from({ length: to - from + 1 }, (_, back) => String(to - back));
}
