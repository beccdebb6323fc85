import 'server-only';
import { createHash } from 'node:crypto';
import { Op } from 'sequelize';
import { database } from '@/lib/server/db/database';
import { newId } from '@/lib/server/db/new-id';
import { toBinary } from '@/lib/server/db/uuid-binary';

/** Wrong passwords an account may see within the window before it has to wait. */
const FREE_FAILURES = 5;
const WINDOW_MS = 15 * 60_000;
/** The wait doubles from one second up to this; an account is never shut for good. */
const LONGEST_WAIT_SECONDS = 60;

/** Attempts one address may make in a minute, over all accounts. */
const ATTEMPTS_PER_MINUTE = 300;
const MINUTE_MS = 60_000;

/** Rows older than this serve nothing any more. */
const KEPT_MS = 24 * 60 * 60_000;

/** Who tries to sign in. */
export interface LoginSubject {
  email: string;
  address: string;
}

/** The stored key of an account or address: a hash, so that the table names nobody. */
function subjectOf(kind: 'account' | 'address', text: string): Buffer {
  return createHash('sha256').update(`${kind}:${text.toLowerCase()}`).digest();
}

async function secondsForAccount(email: string, nowMs: number): Promise<number> {
  const attempts = await database().models.LoginAttempt.findAll({
    where: { subject: subjectOf('account', email), at: { [Op.gt]: new Date(nowMs - WINDOW_MS) } },
    order: [['at', 'DESC']],
    limit: 50,
  });
  const firstSuccess = attempts.findIndex((attempt) => !attempt.failed);
  const failures = firstSuccess < 0 ? attempts : attempts.slice(0, firstSuccess);
  const last = failures[0];
  if (!last || failures.length < FREE_FAILURES) return 0;
  const wait = Math.min(LONGEST_WAIT_SECONDS, 2 ** (failures.length - FREE_FAILURES));
  return Math.max(0, Math.ceil((last.at.getTime() + wait * 1000 - nowMs) / 1000));
}

async function secondsForAddress(address: string, nowMs: number): Promise<number> {
  const since = new Date(nowMs - MINUTE_MS);
  const count = await database().models.LoginAttempt.count({
    where: { subject: subjectOf('address', address), at: { [Op.gt]: since } },
  });
  return count < ATTEMPTS_PER_MINUTE ? 0 : MINUTE_MS / 1000;
}

/** Seconds until this account, or this address, may try again; 0 when it may now. Unknown accounts wait alike. */
export async function secondsToWait({ email, address }: LoginSubject, nowMs: number): Promise<number> {
  return (await secondsForAddress(address, nowMs)) || secondsForAccount(email, nowMs);
}

/**
 * Writes an attempt down as failed before the password is looked at, so that a burst of them is counted.
 *
 * @returns a function that marks the attempt as successful.
 */
export async function recordAttempt({ email, address }: LoginSubject, nowMs: number): Promise<() => Promise<void>> {
  const { LoginAttempt } = database().models;
  const id = toBinary(newId());
  const at = new Date(nowMs);
  await LoginAttempt.bulkCreate([
    { id, subject: subjectOf('account', email), failed: true, at },
    { id: toBinary(newId()), subject: subjectOf('address', address), failed: true, at },
  ]);
  return async () => {
    await LoginAttempt.update({ failed: false }, { where: { id } });
    await LoginAttempt.destroy({ where: { at: { [Op.lt]: new Date(nowMs - KEPT_MS) } } });
  };
}
