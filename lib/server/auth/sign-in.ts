import 'server-only';
import { log } from '@/lib/server/log/log';
import { type PasswordAttempt, checkPassword } from './check-password';
import { homeTeam } from './session-rows';

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
export async function signIn(attempt: PasswordAttempt, nowMs: number): Promise<string | null> {
  const proof = await checkPassword({ ...attempt, email: emailKey(attempt.email) }, nowMs);
  if (!proof || !(await homeTeam(proof.userId))) {
    log({ event: 'sign-in-refused' });
    return null;
  }
  await proof.succeeded();
  log({ event: 'sign-in', userId: proof.userId });
  return proof.userId;
}
