import { DemoRefused, loadDemoSeason } from '@/lib/server/demo/load-demo-season';
import { demoWanted } from '@/lib/server/env';
import { demoSignIns } from '@/lib/server/auth/demo-sign-ins';
import type { Progress } from './progress';

/**
 * Loads the demo season into an empty database, or completes it where loading was cut short.
 * A database with a team of its own is left alone; with `DEMO` other than 1 so is an empty one.
 */
export async function loadDemoWhenEmpty(progress: Progress): Promise<void> {
  if (!demoWanted()) return;
  try {
    await progress.step('loading the demo season', () => loadDemoSeason(progress.note));
  } catch (error) {
    if (!(error instanceof DemoRefused)) throw error;
    progress.note('this database has a team of its own and stays as it is');
  }
}

/** The lines that tell a person how to sign in to the demo; none when it was never loaded here. */
export async function demoSignInLines(): Promise<string[]> {
  const people = await demoSignIns();
  const [first] = people;
  if (!first) return ['There is no demo season here: sign in with your own account.'];
  const width = Math.max(...people.map(({ email }) => email.length));
  return [
    `Demo sign-ins, all with the password ${first.password}`,
    ...people.map(({ email, role, team }) => `  ${email.padEnd(width)}  ${role}, ${team}`),
  ];
}
