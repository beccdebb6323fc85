import 'server-only';
import type { NextApiRequest, NextApiResponse } from 'next';
import NextAuth from 'next-auth';
import { systemClock } from '@/lib/kit/system-clock';
import { newId } from '@/lib/server/db/new-id';
import { publicUrl } from '@/lib/server/env';
import { clientAddress } from '@/lib/server/http/client-address';
import { isForeign } from '@/lib/server/http/csrf';
import { failureResponse } from '@/lib/server/http/failure-response';
import { HttpProblem } from '@/lib/server/http/problem';
import type { RouteContext } from '@/lib/server/http/route';
import { agentWords } from './agent-words';
import { type AuthCaller, authOptions } from './auth-options';
import { type AuthRequest, authRequest } from './auth-request';
import { AuthResponse } from './auth-response';
import { secondsToWait } from './login-throttle';
import { isTooLong } from './password';
import { emailKey } from './sign-in';

/** Longest e-mail address that is looked at (RFC 5321: 254 octets). */
const MAX_EMAIL = 254;

/** Refuses what can be no sign-in before any hashing: control characters, endless texts. */
function checkCredentials({ email = '', password = '' }: Record<string, string>): void {
  const hasControl = [...email].some((character) => character < ' ' || character === '\u007f');
  if (hasControl || email.length > MAX_EMAIL || isTooLong(password)) throw new HttpProblem('shape');
}

/** Keeps a guesser waiting. The `url` member is where next-auth's own browser code looks for what went wrong. */
async function checkThrottle(email: string, address: string): Promise<void> {
  const seconds = await secondsToWait({ email: emailKey(email), address }, systemClock.now());
  if (seconds === 0) return;
  const members = { url: `${publicUrl()}/sign-in?error=too-many&seconds=${seconds}` };
  throw new HttpProblem('too-many', { headers: { 'Retry-After': String(seconds) }, members });
}

async function answer(authReq: AuthRequest, caller: AuthCaller): Promise<Response> {
  const response = new AuthResponse();
  // next-auth's handler for plain Node reads and writes only what these two classes have.
  await NextAuth(authReq as unknown as NextApiRequest, response as unknown as NextApiResponse, authOptions(caller));
  return response.toResponse();
}

/**
 * Everything under `/api/auth`: next-auth, with foreign requests, unknown addresses and guessers kept in front of it.
 */
export async function authRoute(request: Request, context: RouteContext): Promise<Response> {
  try {
    if (isForeign(request)) throw new HttpProblem('csrf');
    const { nextauth } = await context.params;
    const authReq = await authRequest(request, Array.isArray(nextauth) ? nextauth : []);
    const address = clientAddress(request.headers);
    if (authReq.query.nextauth?.[0] === 'callback') {
      checkCredentials(authReq.body);
      await checkThrottle(authReq.body.email ?? '', address);
    }
    return await answer(authReq, { address, agent: agentWords(request.headers.get('user-agent') ?? '') });
  } catch (error) {
    return failureResponse(error, newId());
  }
}
