import 'server-only';
import { hashPassword } from '@/lib/server/auth/password';
import { memberContext } from '@/lib/server/auth/member-context';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { teamId, userId } from './build/names';
import { type SeasonStep, seasonSteps } from './build/season-steps';
import { demoState } from './load/demo-state';
import { pushBatch } from './load/push-batch';
import { takeDecision } from './load/take-decision';
import { writeOutcomes } from './load/write-outcomes';
import { writeTeam } from './load/write-team';
import { SEASON } from './season';
import { DEMO_PASSWORD } from './story/person';
import type { TeamStory } from './story/team-story';

/** The database holds teams or people that are not the demo's, so the demo season stays out of it. */
export class DemoRefused extends Error {
  constructor() {
    super('The database holds a team of its own. The demo season is loaded into an empty database only.');
    this.name = 'DemoRefused';
  }
}

/** Told what is being loaded, one line at a time. */
export type Report = (line: string) => void;

async function contextsOf(team: TeamStory): Promise<Map<string, TeamContext>> {
  const contexts = new Map<string, TeamContext>();
  for (const person of team.people) contexts.set(person.email, await memberContext(teamId(team), userId(person)));
  return contexts;
}

async function takeStep(step: SeasonStep, contexts: ReadonlyMap<string, TeamContext>): Promise<void> {
  const ctx = contexts.get(step.by.email);
  if (!ctx) throw new Error(`${step.by.name} is not one of the team.`);
  if (step.kind === 'push') await pushBatch(ctx, step);
  else await takeDecision(ctx, step);
}

async function loadTeam(team: TeamStory, passwordHash: string): Promise<void> {
  await writeTeam(team, passwordHash);
  const contexts = await contextsOf(team);
  for (const step of seasonSteps(team)) await takeStep(step, contexts);
}

/**
 * Loads the demo season: two teams with their people, hosts, settings, nests, visits, readings and decisions, exactly
 * as phones and lab would have brought them in. Everything has a fixed id, so loading that was cut short is completed
 * by loading again, and a second call finds nothing to do.
 *
 * @param report told each team as it is loaded, and when everything was there already.
 * @returns false when the season was there already.
 * @throws DemoRefused when the database holds somebody's own team or people.
 */
export async function loadDemoSeason(report: Report = () => {}): Promise<boolean> {
  const state = await demoState();
  if (state === 'foreign') throw new DemoRefused();
  if (state === 'loaded') {
    report('The demo season is here already.');
    return false;
  }
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  for (const team of SEASON) {
    report(`${team.name}: ${team.nests.length} nests`);
    await loadTeam(team, passwordHash);
  }
  await writeOutcomes(SEASON);
  return true;
}
