import 'server-only';
import { createHash } from 'node:crypto';
import { Op } from 'sequelize';
import { database } from '@/lib/server/db/database';
import { newId } from '@/lib/server/db/new-id';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';

/** A phone that drains a season's backlog sends far fewer; only a broken one sends more. */
const PUSHES_PER_MINUTE = 1_000;
const MINUTE_MS = 60_000;

/** Counted rows are cleared away when this many have gathered. */
const CLEAR_ABOVE = 100;

/**
 * Counts a push of a device, in the database so that several servers count together.
 *
 * @throws HttpProblem `too-many` above the limit; the phone keeps its operations and comes back.
 */
export async function countPush(deviceId: string, nowMs: number): Promise<void> {
  const { LoginAttempt } = database().models;
  const subject = createHash('sha256').update(`push:${deviceId}`).digest();
  const since = new Date(nowMs - MINUTE_MS);
  const count = await LoginAttempt.count({ where: { subject, at: { [Op.gt]: since } } });
  if (count >= PUSHES_PER_MINUTE) throw new HttpProblem('too-many', { headers: { 'Retry-After': '30' } });
  if (count >= CLEAR_ABOVE) await LoginAttempt.destroy({ where: { subject, at: { [Op.lte]: since } } });
  await LoginAttempt.create({ id: toBinary(newId()), subject, failed: false, at: new Date(nowMs) });
}
