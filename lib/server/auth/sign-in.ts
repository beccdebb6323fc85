import 'server-only';
import { log } from '@/lib/server/log/log';
import { database } from '@/lib/server/db/database';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { recordAttempt } from './login-throttle';
import { verifyPassword } from './password';
import { homeTeam } from './session-rows';

/** What somebody typed, and where from. */
export interface SignInAttempt {
  email: string;
  password: string;
  address: string;
}

/** The spelling under which accounts are looked up; what a person typed is never changed elsewhere. */
export function emailKey(email: string): string {
  return email.trim().toLowerCase();
}

/**
 * Checks an e-mail and password. Unknown, disabled and team-less accounts take the time of a wrong password and
 * answer alike.
 *
 * @returns the user's id, or null.
 */
export async function signIn({ email, password, address }: SignInAttempt, nowMs: number): Promise<string | null> {
  const key = emailKey(email);
  const succeeded = await recordAttempt({ email: key, address }, nowMs);
  const user = await database().models.User.findOne({ where: { email: key } });
  const matches = await verifyPassword(user?.password_hash ?? null, password);
  const userId = user && matches && user.disabled_at === null ? fromBinary(user.id) : null;
  if (!userId || !(await homeTeam(userId))) {
    log({ event: 'sign-in-refused' });
    return null;
  }
  await succeeded();
  log({ event: 'sign-in', userId });
  return userId;
}
