import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { isDuplicateKey } from '@/lib/server/db/database-errors';
import { newId } from '@/lib/server/db/new-id';
import { toBinary } from '@/lib/server/db/uuid-binary';
import type { NestBrood } from '@/lib/server/queries/brood';

/**
 * Keeps an estimate with the versions that made it, once for each input: who asks again with the same readings and
 * settings finds it there already, also when two ask at the same moment.
 *
 * @param nowMs epoch milliseconds.
 */
export async function keepEstimate(
  ctx: TeamContext,
  { estimate, settingsVersion }: NestBrood,
  nowMs: number,
): Promise<void> {
  const { Estimate } = database().models;
  const key = {
    team_id: toBinary(ctx.teamId),
    nest_id: toBinary(estimate.nest.id),
    input_digest: Buffer.from(estimate.inputDigest, 'hex'),
  };
  if ((await Estimate.count({ where: key })) > 0) return;
  try {
    await Estimate.create({
      ...key,
      id: toBinary(newId()),
      model_version: `${estimate.model.name} ${estimate.model.version}`,
      settings_version: settingsVersion,
      answer: JSON.stringify(estimate),
      created_at: new Date(nowMs),
    });
  } catch (error) {
    if (!isDuplicateKey(error)) throw error;
  }
}
