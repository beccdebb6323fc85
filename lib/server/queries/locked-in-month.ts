import 'server-only';
import { localDate } from '@/lib/kit/local-date';
import { selectRows } from './select-rows';
import type { TeamScope } from './team-scope';

/** A final reading and when it was first locked. */
interface FirstLock {
  id: Buffer;
  at: Date;
}

/** When final readings that were also read in the lab were first locked, by the audit chain, in the order of their ids. */
async function firstLocks(scope: TeamScope): Promise<FirstLock[]> {
  return selectRows<FirstLock>(
    scope,
    `SELECT f.id, MIN(a.at) AS at FROM readings f
       JOIN audit_entries a ON a.team_id = f.team_id AND a.subject_id = f.id AND a.action = 'reading.lock'
      WHERE f.team_id = :team AND f.kind = 'final' AND f.locked_version IS NOT NULL AND EXISTS
        (SELECT 1 FROM readings s WHERE s.team_id = f.team_id AND s.visit_id = f.visit_id AND s.kind = 'second'
           AND s.submitted_at IS NOT NULL)
      GROUP BY f.id ORDER BY f.id`,
  );
}

/** The final readings first locked in a local month (`YYYY-MM`) that a lab reader had read too. */
export async function lockedInMonth(scope: TeamScope, zone: string, month: string): Promise<Buffer[]> {
  const locks = await firstLocks(scope);
  return locks.filter(({ at }) => localDate(at.getTime(), zone).startsWith(month)).map(({ id }) => id);
}

/** The months that are over and have something to draw from but no draw yet, oldest first. */
export async function undrawnMonths(scope: TeamScope, zone: string, nowMs: number): Promise<string[]> {
  const drawn = await selectRows<{ month: string }>(
    scope,
    'SELECT DISTINCT month FROM reading_samples WHERE team_id = :team',
  );
  const taken = new Set([...drawn.map(({ month }) => month), localDate(nowMs, zone).slice(0, 7)]);
  const months = (await firstLocks(scope)).map(({ at }) => localDate(at.getTime(), zone).slice(0, 7));
  return [...new Set(months)].filter((month) => !taken.has(month)).sort();
}
