import 'server-only';
import { createHash } from 'node:crypto';
import { Op } from 'sequelize';
import { database } from '@/lib/server/db/database';
import { newId } from '@/lib/server/db/new-id';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';

/** How often something may be done. */
export interface Allowance {
  /** Who does what, such as `reset:<e-mail>`; kept as a hash. */
  subject: string;
  most: number;
  perMs: number;
}

/**
 * Counts an act against its allowance, in the database so that several servers count together.
 *
 * @throws HttpProblem `too-many` when it is used up.
 */
export async function takeAllowance({ subject, most, perMs }: Allowance, nowMs: number): Promise<void> {
  const { LoginAttempt } = database().models;
  const key = createHash('sha256').update(`allowance:${subject}`).digest();
  const since = new Date(nowMs - perMs);
  const earlier = await LoginAttempt.findAll({
    where: { subject: key, at: { [Op.gt]: since } },
    order: [['at', 'DESC']],
    limit: most,
  });
  const oldest = earlier.at(-1);
  if (oldest && earlier.length >= most) {
    const seconds = Math.max(1, Math.ceil((oldest.at.getTime() + perMs - nowMs) / 1000));
    throw new HttpProblem('too-many', { headers: { 'Retry-After': String(seconds) } });
  }
  await LoginAttempt.create({ id: toBinary(newId()), subject: key, failed: false, at: new Date(nowMs) });
}
