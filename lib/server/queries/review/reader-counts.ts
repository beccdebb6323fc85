import 'server-only';
import { idKey } from '@/lib/server/queries/id-key';
import { selectRows } from '@/lib/server/queries/select-rows';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import type { ClaimRow } from './claims';

/** How much one person of the lab has in hand, and has done. */
export interface ReaderCounts {
  name: string;
  /** Second readings taken on and not handed in. */
  reading: number;
  /** Second readings handed in. */
  read: number;
  /** Versions of final readings locked. */
  locked: number;
}

interface CountRow {
  id: Buffer;
  name: string;
  read: number | string;
  locked: number | string;
}

const COUNTS = `
  SELECT u.id, u.display_name AS name,
    (SELECT COUNT(*) FROM readings r WHERE r.team_id = :team AND r.opened_by = u.id AND r.kind = 'second'
     AND r.submitted_at IS NOT NULL) AS \`read\`,
    (SELECT COUNT(*) FROM reading_locks l WHERE l.team_id = :team AND l.actor_id = u.id) AS locked
  FROM memberships m JOIN users u ON u.id = m.user_id
  WHERE m.team_id = :team AND m.role IN ('reviewer', 'biologist')
  ORDER BY u.display_name`;

const HANDED_IN = `
  SELECT visit_id AS visit, opened_by AS reader FROM readings
  WHERE team_id = :team AND kind = 'second' AND submitted_at IS NOT NULL`;

/** The people of the lab with their counts, by name. */
export async function readerCounts(scope: TeamScope, claims: ReadonlyMap<string, ClaimRow>): Promise<ReaderCounts[]> {
  const people = await selectRows<CountRow>(scope, COUNTS);
  const handedIn = await selectRows<{ visit: Buffer; reader: Buffer }>(scope, HANDED_IN);
  const done = new Set(handedIn.map(({ visit, reader }) => `${idKey(visit)} ${idKey(reader)}`));
  const open = [...claims.values()].filter((claim) => !done.has(`${idKey(claim.visit_id)} ${idKey(claim.user_id)}`));
  return people.map(({ id, name, read, locked }) => ({
    name,
    reading: open.filter((claim) => claim.user_id.equals(id)).length,
    read: Number(read),
    locked: Number(locked),
  }));
}
