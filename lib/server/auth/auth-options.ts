import 'server-only';
import type { AuthOptions } from 'next-auth';
import Credentials from 'next-auth/providers/credentials';
import { systemClock } from '@/lib/kit/system-clock';
import { authSecret, publicUrl } from '@/lib/server/env';
import { log } from '@/lib/server/log/log';
import { loadSession } from './load-session';
import { ownUrl } from './own-url';
import { SESSION_SECONDS, cookieName, overHttps } from './session-cookie';
import { formatSid, parseSid } from './session-id';
import { openSession, revokeSession } from './session-rows';
import { signIn } from './sign-in';

/** Thrown for a token whose session was ended; next-auth then clears the cookie. */
const ENDED = 'session ended';

function cookie(base: Parameters<typeof cookieName>[0]) {
  return {
    name: cookieName(base),
    options: { httpOnly: true, sameSite: 'lax' as const, path: '/', secure: overHttps() },
  };
}

const callbacks = (agent: string): AuthOptions['callbacks'] => ({
  redirect: ({ url, baseUrl }) => ownUrl(url) ?? baseUrl,

  /** The token names the session's row and nothing else: rights are read from the database on every request. */
  jwt: async ({ token, user }) => {
    const now = systemClock.now();
    if (user) {
      const ref = await openSession({ userId: user.id, agent }, now);
      if (!ref) throw new Error(ENDED);
      return { sub: user.id, sid: formatSid(ref) };
    }
    const ref = parseSid(token.sid);
    if (!ref || !(await loadSession(ref, now))) throw new Error(ENDED);
    return { sub: token.sub, sid: token.sid };
  },

  /** What `GET /api/auth/session` shows of it. */
  session: async ({ session, token }) => {
    const ref = parseSid(token.sid);
    const context = ref && (await loadSession(ref, systemClock.now()));
    return { expires: session.expires, user: { name: context?.displayName ?? null } };
  },
});

/** Who sends a request to next-auth, as far as it matters here. */
export interface AuthCaller {
  address: string;
  /** The browser in words. */
  agent: string;
}

/** How next-auth is set up. A function, because the address and the key are known only when the server runs. */
export function authOptions({ address, agent }: AuthCaller): AuthOptions {
  // next-auth reads its own address from the environment and from nowhere else.
  process.env.NEXTAUTH_URL ??= publicUrl();
  return {
    secret: authSecret(),
    session: { strategy: 'jwt', maxAge: SESSION_SECONDS },
    pages: { signIn: '/sign-in', error: '/sign-in', signOut: '/sign-in' },
    cookies: {
      sessionToken: cookie('session-token'),
      csrfToken: cookie('csrf-token'),
      callbackUrl: cookie('callback-url'),
    },
    providers: [
      Credentials({
        credentials: { email: {}, password: {} },
        authorize: async (credentials) => {
          const { email = '', password = '' } = credentials ?? {};
          const id = await signIn({ email, password, address }, systemClock.now());
          return id ? { id } : null;
        },
      }),
    ],
    callbacks: callbacks(agent),
    events: {
      signOut: async ({ token }) => {
        const ref = parseSid(token.sid);
        if (ref) await revokeSession(ref, systemClock.now());
      },
    },
    logger: {
      error: (code, metadata) =>
        log({ event: 'next-auth', code, error: metadata instanceof Error ? metadata.name : null }),
      warn: (code) => log({ event: 'next-auth', code }),
      debug: () => undefined,
    },
  };
}
