import 'server-only';
import { decode, encode } from 'next-auth/jwt';
import { authSecret, publicUrl } from '@/lib/server/env';
import { type SessionRef, formatSid, parseSid } from './session-id';

/** A sign-in lasts this long after it was last used. */
export const SESSION_SECONDS = 30 * 24 * 60 * 60;

/** Is the product reached over https? Then cookies are Secure and bound to the host. */
export function overHttps(): boolean {
  return publicUrl().startsWith('https:');
}

/** The name of a cookie of ours or of next-auth; over https with the prefix that binds it to this host. */
export function cookieName(base: 'session-token' | 'csrf-token' | 'callback-url'): string {
  return `${overHttps() ? '__Host-' : ''}next-auth.${base}`;
}

/** The value of a cookie in a `Cookie` header; the first one if it is sent twice. */
export function cookieValue(header: string | null, name: string): string | null {
  for (const part of (header ?? '').split(';')) {
    const equals = part.indexOf('=');
    if (equals > 0 && part.slice(0, equals).trim() === name) return part.slice(equals + 1).trim();
  }
  return null;
}

/** What a session token says about itself. */
export interface SessionToken extends SessionRef {
  userId: string;
  /** Epoch seconds when the token was written. */
  issuedAt: number;
}

/** Opens a session token; null when it is forged, for another key, expired or not one of ours. */
export async function readSessionToken(token: string | null): Promise<SessionToken | null> {
  if (!token) return null;
  const claims = await decode({ token, secret: authSecret() }).catch(() => null);
  const ref = parseSid(claims?.sid);
  if (!claims?.sub || !ref) return null;
  return { ...ref, userId: claims.sub, issuedAt: Number(claims.iat ?? 0) };
}

/** A `Set-Cookie` line that carries the session for another `SESSION_SECONDS`. */
export async function sessionSetCookie({ userId, ...ref }: SessionRef & { userId: string }): Promise<string> {
  const claims = { sub: userId, sid: formatSid(ref) };
  const token = await encode({ token: claims, secret: authSecret(), maxAge: SESSION_SECONDS });
  const secure = overHttps() ? '; Secure' : '';
  return `${cookieName('session-token')}=${token}; Path=/; Max-Age=${SESSION_SECONDS}; HttpOnly; SameSite=Lax${secure}`;
}
