import 'server-only';
import { z } from 'zod';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { lineText } from '@/lib/server/commands/members/inputs';
import { idInPath, teamAct } from '@/lib/server/commands/team-act';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { may } from '@/lib/server/policies/may';

/** Body of a withdrawal. */
export const REVOKE_INPUT = z.strictObject({ reason: lineText });

/**
 * Withdraws a phone for good: its next request is refused. One's own, or any of the team's for a coordinator. A phone
 * that turns up again is enrolled anew.
 *
 * @param text the device's id as it stands in the address.
 * @throws HttpProblem `not-found`, also for another person's phone, or `revoked` when it was withdrawn before.
 */
export async function revokeDevice(
  ctx: TeamContext,
  { text, reason }: { text: string | undefined; reason: string },
  nowMs: number,
): Promise<{ id: string }> {
  const id = idInPath(text);
  return teamAct(ctx, nowMs, async (transaction) => {
    const own = may(ctx.role, 'members.write') ? {} : { user_id: toBinary(ctx.userId) };
    const where = { team_id: toBinary(ctx.teamId), id: toBinary(id), ...own };
    const device = await database().models.Device.findOne({ where, transaction });
    if (!device) throw new HttpProblem('not-found');
    if (device.revoked_at !== null) throw new HttpProblem('revoked');
    const by = { revoked_by: toBinary(ctx.userId), revoke_reason: reason };
    await device.update({ revoked_at: new Date(nowMs), ...by }, { transaction });
    return { result: { id }, event: { action: 'device.revoke', subjectId: id, detail: { reason } } };
  });
}
