import * as z from 'zod';
import { classifyAnswer } from './classify-answer';
import { type Network, PROBE_TIMEOUT_MS } from './network';

const TOKEN = z.object({ csrfToken: z.string() });

/**
 * Ends the session at the office.
 *
 * @returns false when the office could not be asked; the phone then asks again when it opens next.
 */
export async function signOutAtOffice(network: Network): Promise<boolean> {
  const timeoutMs = PROBE_TIMEOUT_MS;
  const ask = await network.send({ method: 'GET', path: '/api/auth/csrf', timeoutMs });
  const token = classifyAnswer(ask, TOKEN);
  if (token.kind !== 'ok') return false;
  const body = JSON.stringify({ csrfToken: token.value.csrfToken, callbackUrl: '/sign-in', json: 'true' });
  const answer = await network.send({ method: 'POST', path: '/api/auth/signout', body, timeoutMs });
  return answer.kind === 'answer' && answer.status === 200;
}
