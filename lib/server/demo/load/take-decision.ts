import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { amendReading } from '@/lib/server/commands/readings/amend-reading';
import { lockReading } from '@/lib/server/commands/readings/lock-reading';
import { settleReading } from '@/lib/server/commands/readings/settle-reading';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import type { DecideStep } from '@/lib/server/demo/build/season-steps';

/** Has the final reading come as far as this decision leaves it, or further? */
async function isTaken({ teamId }: TeamContext, { reading, decision: { leaves } }: DecideStep): Promise<boolean> {
  const where = { team_id: toBinary(teamId), based_on: toBinary(reading) };
  const final = await database().models.Reading.findOne({ where, raw: true });
  if (!final) return false;
  const version = final.version ?? 1;
  if (version !== leaves.version) return version > leaves.version;
  return (final.locked_version ?? 0) >= (leaves.lockedVersion ?? 0);
}

/** Takes one decision of the lab in the person's name, at its time in the season; one already taken is left alone. */
export async function takeDecision(ctx: TeamContext, step: DecideStep): Promise<void> {
  if (await isTaken(ctx, step)) return;
  const {
    reading: id,
    atMs,
    decision: { act },
  } = step;
  if (act.kind === 'settle') await settleReading(ctx, { id, cells: act.cells.map((cell) => ({ ...cell })) }, atMs);
  else if (act.kind === 'lock') await lockReading(ctx, { id }, atMs);
  else await amendReading(ctx, { id, reason: act.reason }, atMs);
}
