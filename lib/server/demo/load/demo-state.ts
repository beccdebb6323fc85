import 'server-only';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { database } from '@/lib/server/db/database';
import { outcomeId, teamId, userId } from '@/lib/server/demo/build/names';
import { SEASON } from '@/lib/server/demo/season';

/**
 * What the database holds: nothing, a part of the demo season (its loading was cut short), all of it, or teams and
 * people of somebody's own.
 */
export type DemoState = 'empty' | 'unfinished' | 'loaded' | 'foreign';

/** The outcomes are written last and together, so one of them says that everything is there. */
async function isComplete(): Promise<boolean> {
  const last = SEASON.flatMap((team) => team.nests.flatMap((nest) => (nest.outcome ? [{ team, nest }] : []))).at(-1);
  if (!last) return false;
  const where = { team_id: toBinary(teamId(last.team)), id: toBinary(outcomeId(last.nest)) };
  return (await database().models.Outcome.count({ where })) > 0;
}

/** Looks whether the demo season was loaded here, or may be. */
export async function demoState(): Promise<DemoState> {
  if (await isComplete()) return 'loaded';
  const { Team, User } = database().models;
  const rows = [
    ...(await Team.findAll({ attributes: ['id'], raw: true })),
    ...(await User.findAll({ attributes: ['id'], raw: true })),
  ];
  if (rows.length === 0) return 'empty';
  const ours = new Set(SEASON.flatMap((team) => [teamId(team), ...team.people.map(userId)]));
  return rows.every(({ id }) => ours.has(fromBinary(id))) ? 'unfinished' : 'foreign';
}
