import 'server-only';
import { database } from '@/lib/server/db/database';
import { inTransaction } from '@/lib/server/db/in-transaction';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { demoId } from '@/lib/server/demo/build/demo-id';
import { nestName, outcomeId, teamId } from '@/lib/server/demo/build/names';
import type { NestStory } from '@/lib/server/demo/story/nest-story';
import type { TeamStory } from '@/lib/server/demo/story/team-story';

function outcomeRow(team: TeamStory, nest: NestStory) {
  if (!nest.outcome) return [];
  const { outcome, decidedOn, note } = nest.outcome;
  const ids = {
    team_id: toBinary(teamId(team)),
    id: toBinary(outcomeId(nest)),
    nest_id: toBinary(demoId(nestName(nest))),
  };
  return [{ ...ids, outcome, decided_on: decidedOn, note }];
}

/** Writes the outcome of every nest, all at once: they are the last the demo season writes. */
export async function writeOutcomes(teams: readonly TeamStory[]): Promise<void> {
  const rows = teams.flatMap((team) => team.nests.flatMap((nest) => outcomeRow(team, nest)));
  await inTransaction(async (transaction) => {
    await database().models.Outcome.bulkCreate(rows, { transaction });
  });
}
