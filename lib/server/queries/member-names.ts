import 'server-only';
import { idKey } from './id-key';
import { selectRows } from './select-rows';
import type { TeamScope } from './team-scope';

/** The name of a person of the team; blank for somebody who never was a member. */
export type NameOf = (user: Buffer) => string;

/** The display names of everyone in the team, for putting beside what they recorded. */
export async function memberNames(scope: TeamScope): Promise<NameOf> {
  const rows = await selectRows<{ id: Buffer; name: string }>(
    scope,
    'SELECT u.id, u.display_name AS name FROM memberships m JOIN users u ON u.id = m.user_id WHERE m.team_id = :team',
  );
  const names = new Map(rows.map(({ id, name }) => [idKey(id), name]));
  return (user) => names.get(idKey(user)) ?? '';
}
