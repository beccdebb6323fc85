import { stringMember } from './string-member';

/** What came of a sign-in. */
export type SignInResult =
  | { kind: 'in' }
  | { kind: 'wrong' }
  /** Too many attempts; `seconds` until the next one counts. */
  | { kind: 'wait'; seconds: number }
  | { kind: 'unreachable' }
  | { kind: 'failed' };

/** What a person signs in with. */
export interface Credentials {
  email: string;
  password: string;
}

const LONGEST_WAIT_SECONDS = 3600;

/** Seconds to wait as the answer says; one minute when it does not. */
function waitSeconds(answer: Response): number {
  const seconds = Number(answer.headers.get('Retry-After'));
  return Number.isInteger(seconds) && seconds > 0 ? Math.min(seconds, LONGEST_WAIT_SECONDS) : 60;
}

/** Where next-auth wants to go says whether it took the sign-in: an address with an error or back to the form means no. */
async function wentWell(answer: Response): Promise<boolean> {
  const url = stringMember(await answer.json(), 'url');
  return url !== null && !/[?&](error|csrf)=/.test(url);
}

async function resultOf(answer: Response): Promise<SignInResult> {
  if (answer.status === 429) return { kind: 'wait', seconds: waitSeconds(answer) };
  if (answer.status === 401 || answer.status === 400) return { kind: 'wrong' };
  return answer.ok && (await wentWell(answer)) ? { kind: 'in' } : { kind: 'failed' };
}

/**
 * Signs in with e-mail and password: fetches the form token, then posts both. Never throws.
 *
 * @param fetcher the browser's `fetch`.
 */
export async function requestSignIn({ email, password }: Credentials, fetcher: typeof fetch): Promise<SignInResult> {
  try {
    const token = await fetcher('/api/auth/csrf', { cache: 'no-store' });
    if (!token.ok) return { kind: 'failed' };
    const csrfToken = stringMember(await token.json(), 'csrfToken') ?? '';
    const body = new URLSearchParams({ email, password, csrfToken, json: 'true', callbackUrl: '/' });
    return await resultOf(await fetcher('/api/auth/callback/credentials', { method: 'POST', body }));
  } catch (cause) {
    return cause instanceof TypeError ? { kind: 'unreachable' } : { kind: 'failed' };
  }
}

/** Where to go after signing in: a path of this site, or the start page when the asked one is anything else. */
export function pathAfterSignIn(asked: string | undefined): string {
  const isOwnPath = asked !== undefined && /^\/(?![/\\])[\x21-\x7e]*$/.test(asked) && !asked.includes('\\');
  return isOwnPath ? asked : '/';
}
