import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/server/db/database';
import { SEASON } from '@/lib/server/demo/season';
import { DEMO_PASSWORD } from '@/lib/server/demo/story/person';

/** A sign-in anybody may try the product with. */
export interface DemoSignIn {
  email: string;
  password: string;
  name: string;
  role: string;
  team: string;
}

/**
 * The invented people of the demo season who can sign in, in the order of the season; empty when it was never loaded.
 * Asked by the sign-in page, so before anybody is signed in: it names nobody else.
 */
export async function demoSignIns(): Promise<DemoSignIn[]> {
  const emails = SEASON.flatMap((team) => team.people.map((person) => person.email));
  const rows = await database().sequelize.query<Omit<DemoSignIn, 'password'>>(
    `SELECT u.email, u.display_name AS name, m.role, t.name AS team
     FROM users u JOIN memberships m ON m.user_id = u.id JOIN teams t ON t.id = m.team_id
     WHERE u.email IN (:emails) AND u.disabled_at IS NULL AND m.ended_at IS NULL`,
    { type: QueryTypes.SELECT, replacements: { emails } },
  );
  const order = (row: { email: string }) => emails.indexOf(row.email);
  return rows.sort((a, b) => order(a) - order(b)).map((row) => ({ ...row, password: DEMO_PASSWORD }));
}
