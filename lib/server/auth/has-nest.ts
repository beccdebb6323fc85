import 'server-only';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import type { TeamContext } from './team-context';

/** Has the team opened a nest yet? Decides where its people begin. */
export async function hasNest(ctx: TeamContext): Promise<boolean> {
  const where = { team_id: toBinary(ctx.teamId) };
  return (await database().models.Nest.findOne({ where, attributes: ['id'] })) !== null;
}
