import 'server-only';
import { randomBytes } from 'node:crypto';
import type { EnrolResponse } from '@/lib/protocol/enrol';
import { SCHEMA } from '@/lib/protocol/limits';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { newId } from '@/lib/server/db/new-id';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { writableEpoch } from './server-epoch';

/** Bytes of the secret that locks a person's unsent work on a shared phone. */
const KEY_BYTES = 32;

/** Gives a phone an identity of its own, bound to this person in this team. */
export async function enrolDevice(ctx: TeamContext, label: string, nowMs: number): Promise<EnrolResponse> {
  const epoch = await writableEpoch();
  const deviceId = newId();
  const key = randomBytes(KEY_BYTES);
  const now = new Date(nowMs);
  await database().models.Device.create({
    team_id: toBinary(ctx.teamId),
    id: toBinary(deviceId),
    user_id: toBinary(ctx.userId),
    label,
    device_key: key,
    enrolled_at: now,
    last_seen_at: now,
    revoked_at: null,
  });
  return { deviceId, deviceKey: key.toString('base64url'), epoch, schema: SCHEMA, serverTime: now.toISOString() };
}
