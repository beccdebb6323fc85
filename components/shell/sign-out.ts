import { stringMember } from './string-member';

/** Ends the session at the office; true when it is ended. Needs the form token next-auth asks for. */
export async function requestSignOut(fetcher: typeof fetch): Promise<boolean> {
  try {
    const token = await fetcher('/api/auth/csrf', { cache: 'no-store' });
    const csrfToken = stringMember(await token.json(), 'csrfToken') ?? '';
    const body = new URLSearchParams({ csrfToken, json: 'true', callbackUrl: '/sign-in' });
    const answer = await fetcher('/api/auth/signout', { method: 'POST', body });
    return answer.ok;
  } catch {
    return false;
  }
}
