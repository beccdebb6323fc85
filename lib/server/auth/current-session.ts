import 'server-only';
import { cookies } from 'next/headers';
import { redirect } from 'next/navigation';
import { cache } from 'react';
import { systemClock } from '@/lib/kit/system-clock';
import { type Action, may } from '@/lib/server/policies/may';
import { loadSession } from './load-session';
import { type SessionToken, cookieName, cookieValue, readSessionToken, sessionSetCookie } from './session-cookie';
import type { TeamContext } from './team-context';

/** The cookie is written anew when it is older than this, so that a sign-in in use never runs out. */
const RENEW_AFTER_SECONDS = 24 * 60 * 60;

/** A request's session. */
export interface RequestSession {
  context: TeamContext;
  /** A `Set-Cookie` line to answer with when the cookie is due for renewal, else null. */
  renewal: string | null;
}

/**
 * Who is signed in, for pages and layouts; null when nobody is. Asked several times within one page it reads the
 * database once.
 */
export const currentSession = cache(async (): Promise<TeamContext | null> => {
  const jar = await cookies();
  const token = await readSessionToken(jar.get(cookieName('session-token'))?.value ?? null);
  return token ? loadSession(token, systemClock.now()) : null;
});

/** Who sent a request to a route handler; null when the cookie is missing, forged, expired or revoked. */
export async function sessionFromRequest(request: Request, nowMs: number): Promise<RequestSession | null> {
  const token = await readSessionToken(cookieValue(request.headers.get('cookie'), cookieName('session-token')));
  const context = token && (await loadSession(token, nowMs));
  return context ? { context, renewal: await renewalOf(token, nowMs) } : null;
}

async function renewalOf(token: SessionToken, nowMs: number): Promise<string | null> {
  return nowMs / 1000 - token.issuedAt > RENEW_AFTER_SECONDS ? sessionSetCookie(token) : null;
}

/** The session a page needs: sends people who are not signed in to `/sign-in`, others without the right to `/no-access`. */
export async function requirePage(action: Action): Promise<TeamContext> {
  const context = await currentSession();
  if (!context) redirect('/sign-in');
  if (!may(context.role, action)) redirect('/no-access');
  return context;
}
