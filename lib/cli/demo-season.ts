import { QueryTypes, type Sequelize } from 'sequelize';
import { database } from '@/lib/server/db/database';
import { DEMO_PASSWORD } from '@/lib/server/demo/story/person';
import { loadDemoSeason } from '@/lib/server/demo/load-demo-season';
import { demoWanted } from '@/lib/server/env';
import type { Progress } from './progress';

/** One person who can sign in to the demo. */
interface SignIn {
  email: string;
  role: string;
  team: string;
}

async function hasTeams(sequelize: Sequelize): Promise<boolean> {
  const rows = await sequelize.query('SELECT 1 AS found FROM teams LIMIT 1', { type: QueryTypes.SELECT });
  return rows.length > 0;
}

/** Loads the demo season, unless the database already holds a team or `DEMO` is not 1. */
export async function loadDemoWhenEmpty(progress: Progress): Promise<void> {
  if (await hasTeams(database().sequelize)) return;
  if (!demoWanted()) {
    progress.note('the database is empty and DEMO is not 1: nobody can sign in yet');
    return;
  }
  await progress.step('loading the demo season', () => loadDemoSeason());
}

/** The people of the demo season, empty when it was never loaded here. */
async function demoSignIns(sequelize: Sequelize): Promise<SignIn[]> {
  return sequelize.query<SignIn>(
    `SELECT users.email, memberships.role, teams.name AS team
       FROM memberships JOIN users ON users.id = memberships.user_id JOIN teams ON teams.id = memberships.team_id
      WHERE users.email LIKE '%@tarrow.example' OR users.email LIKE '%@ossle.example'
      ORDER BY teams.name DESC, memberships.role, users.email`,
    { type: QueryTypes.SELECT },
  );
}

/** The lines that tell a person how to sign in to the demo; none when it was never loaded here. */
export async function demoSignInLines(): Promise<string[]> {
  const people = await demoSignIns(database().sequelize);
  if (people.length === 0) return [];
  const width = Math.max(...people.map(({ email }) => email.length));
  return [
    `Demo sign-ins, all with the password ${DEMO_PASSWORD}`,
    ...people.map(({ email, role, team }) => `  ${email.padEnd(width)}  ${role}, ${team}`),
  ];
}
