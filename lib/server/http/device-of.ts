import 'server-only';
import { isUuidText } from '@/lib/kit/uuid';
import { DEVICE_HEADER, UNSENT_HEADER } from '@/lib/protocol/limits';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from './problem';

/** A device enrolled by the person who asks, and not withdrawn. */
export interface EnrolledDevice {
  deviceId: string;
}

/** Use of a device is written down at most this often. */
const SEEN_EVERY_MS = 10 * 60_000;

/** The count of unsent operations a phone reports; null when it says nothing that can be one. */
function unsentOf(request: Request): number | null {
  const text = request.headers.get(UNSENT_HEADER);
  return text !== null && /^\d{1,7}$/.test(text) ? Number(text) : null;
}

/**
 * The device a request names in `X-Device`; null when it names none.
 *
 * @throws HttpProblem `device-revoked` for a device that is unknown, withdrawn, or enrolled by somebody else.
 */
export async function deviceOf(request: Request, ctx: TeamContext, nowMs: number): Promise<EnrolledDevice | null> {
  const deviceId = request.headers.get(DEVICE_HEADER);
  if (deviceId === null) return null;
  const device = isUuidText(deviceId)
    ? await database().models.Device.findOne({
        where: {
          team_id: toBinary(ctx.teamId),
          id: toBinary(deviceId),
          user_id: toBinary(ctx.userId),
          revoked_at: null,
        },
      })
    : null;
  if (!device) throw new HttpProblem('device-revoked');
  const unsent = unsentOf(request) ?? device.unsent;
  if (unsent !== device.unsent || nowMs - device.last_seen_at.getTime() > SEEN_EVERY_MS) {
    await device.update({ last_seen_at: new Date(nowMs), unsent });
  }
  return { deviceId };
}
