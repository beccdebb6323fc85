import 'server-only';
import { QueryTypes } from 'sequelize';
import type { PasswordOwner } from '@/lib/server/auth/password-rules';
import { database } from '@/lib/server/db/database';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';

/** One team of a person. */
export interface OwnTeam {
  id: string;
  name: string;
  zone: string;
}

/** An account with the teams its owner is in, in the order of their ids. */
export interface AccountOwner {
  userId: string;
  email: string;
  name: string;
  teams: readonly OwnTeam[];
}

interface Row {
  email: string;
  name: string;
  teamId: Buffer;
  teamName: string;
  zone: string;
}

/**
 * The account of a person with every team it belongs to; null for one that is disabled or in no team. A password is
 * the person's, not one team's, so this looks over all of them.
 */
export async function accountOwner(userId: string): Promise<AccountOwner | null> {
  const rows = await database().sequelize.query<Row>(
    `SELECT u.email, u.display_name AS name, t.id AS teamId, t.name AS teamName, t.zone
     FROM users u JOIN memberships m ON m.user_id = u.id JOIN teams t ON t.id = m.team_id
     WHERE u.id = ? AND u.disabled_at IS NULL AND m.ended_at IS NULL ORDER BY t.id`,
    { type: QueryTypes.SELECT, replacements: [toBinary(userId)] },
  );
  const [first] = rows;
  if (!first) return null;
  const teams = rows.map(({ teamId, teamName, zone }) => ({ id: fromBinary(teamId), name: teamName, zone }));
  return { userId, email: first.email, name: first.name, teams };
}

/** What the owner's password must not be made of. */
export function passwordOwner({ email, name, teams }: AccountOwner): PasswordOwner {
  return { email, name, teams: teams.map((team) => team.name) };
}
