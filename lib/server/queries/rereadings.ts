import 'server-only';
import { localDate } from '@/lib/kit/local-date';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { undrawnMonths } from './locked-in-month';
import { memberNames } from './member-names';
import { selectRows } from './select-rows';
import { teamScope } from './team-scope';

/** A locked reading that was drawn to be read again. */
export interface Rereading {
  id: string;
  month: string;
  nest: { id: string; code: string };
  /** Local date of the visit. */
  visitDate: string;
  /** By somebody else than `reader`, or by `reader` again. */
  purpose: string;
  /** Who read it first in the lab. */
  reader: string;
  /** Nobody began, somebody is at it, or it is handed in. */
  standing: 'waiting' | 'under way' | 'done';
  /** How the draw can be made again. */
  seed: number;
}

/** What was drawn, and what can still be. Nothing of what anybody read is in it. */
export interface Rereadings {
  /** Waiting ones first, then by month and nest. */
  drawn: Rereading[];
  undrawnMonths: string[];
}

interface SampleRow {
  id: Buffer;
  month: string;
  purpose: string;
  seed: number;
  nest: Buffer;
  code: string;
  started: Date;
  reader: Buffer;
  begun: number;
  done: number;
}

/** Later lab readings of the same visit by somebody who counts for the draw. */
const LATER = `(SELECT %s FROM readings l WHERE l.team_id = s.team_id AND l.visit_id = f.visit_id AND l.kind = 'second'
  AND l.opened_at >= s.drawn_at AND (l.opened_by = b.opened_by) = (s.purpose = 'same-reader') %t)`;

const SAMPLES = `SELECT s.id, s.month, s.purpose, s.seed, n.id AS nest, n.code, v.started_at AS started,
    b.opened_by AS reader, ${LATER.replace('%s', 'COUNT(*)').replace('%t', '')} AS begun,
    ${LATER.replace('%s', 'COUNT(*)').replace('%t', 'AND l.submitted_at IS NOT NULL')} AS done
  FROM reading_samples s
  JOIN readings f ON f.team_id = s.team_id AND f.id = s.reading_id
  JOIN visits v ON v.team_id = f.team_id AND v.id = f.visit_id
  JOIN nests n ON n.team_id = f.team_id AND n.id = f.nest_id
  JOIN readings b ON b.team_id = f.team_id AND b.id = (
    SELECT x.id FROM readings x WHERE x.team_id = f.team_id AND x.visit_id = f.visit_id AND x.kind = 'second'
      AND x.submitted_at IS NOT NULL ORDER BY x.opened_at, x.id LIMIT 1)
  WHERE s.team_id = :team ORDER BY s.month, n.code, s.purpose`;

function standingOf({ begun, done }: SampleRow): Rereading['standing'] {
  if (Number(done) > 0) return 'done';
  return Number(begun) > 0 ? 'under way' : 'waiting';
}

/**
 * The readings drawn to be read again and how far they are.
 *
 * @param nowMs epoch milliseconds.
 */
export async function rereadings(ctx: TeamContext, nowMs: number): Promise<Rereadings> {
  const scope = teamScope(ctx);
  const nameOf = await memberNames(scope);
  const rows = await selectRows<SampleRow>(scope, SAMPLES);
  const drawn = rows.map((row) => ({
    id: fromBinary(row.id),
    month: row.month,
    nest: { id: fromBinary(row.nest), code: row.code },
    visitDate: localDate(row.started.getTime(), ctx.zone),
    purpose: row.purpose,
    reader: nameOf(row.reader),
    standing: standingOf(row),
    seed: Number(row.seed),
  }));
  const isDone = ({ standing }: Rereading) => Number(standing === 'done');
  return {
    drawn: drawn.sort((a, b) => isDone(a) - isDone(b)),
    undrawnMonths: await undrawnMonths(scope, ctx.zone, nowMs),
  };
}
