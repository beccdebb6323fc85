import 'server-only';
import { checkPassword } from '@/lib/server/auth/check-password';
import { secondsToWait } from '@/lib/server/auth/login-throttle';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { HttpProblem } from '@/lib/server/http/problem';
import { accountOwner } from './account-owner';
import { setPassword } from './set-password';

/** What a person gives to change their password. */
export interface OwnPasswordChange {
  current: string;
  password: string;
  address: string;
}

/**
 * Changes one's own password. The sign-in it happens in goes on, all others end.
 *
 * @throws HttpProblem `wrong-password`, `too-many`, `password-length`, `common`.
 */
export async function changePassword(
  ctx: TeamContext,
  { current, password, address }: OwnPasswordChange,
  nowMs: number,
): Promise<Record<string, never>> {
  const owner = await accountOwner(ctx.userId);
  if (!owner) throw new HttpProblem('not-found');
  const { email } = owner;
  const seconds = await secondsToWait({ email, address }, nowMs);
  if (seconds > 0) throw new HttpProblem('too-many', { headers: { 'Retry-After': String(seconds) } });
  const proof = await checkPassword({ email, password: current, address }, nowMs);
  if (!proof) throw new HttpProblem('wrong-password');
  await proof.succeeded();
  const claim = () => Promise.resolve();
  await setPassword({ owner, password, action: 'password.change', keepSession: ctx.sessionId, claim }, nowMs);
  return {};
}
