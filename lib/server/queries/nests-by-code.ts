import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { selectRows } from './select-rows';
import { teamScope } from './team-scope';

/** The ids of the team's nests with these codes, by code; of several with one code the one opened first. */
export async function nestsByCode(ctx: TeamContext, codes: readonly string[]): Promise<Record<string, string>> {
  const rows = await selectRows<{ id: Buffer; code: string }>(
    teamScope(ctx),
    'SELECT id, code FROM nests WHERE team_id = :team AND code IN (:codes) ORDER BY opened_at DESC, id DESC',
    { codes: [...codes] },
  );
  return Object.fromEntries(rows.map(({ id, code }) => [code, fromBinary(id)]));
}
