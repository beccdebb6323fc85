import { describe, expect, it } from 'vitest';
import { pathAfterSignIn, requestSignIn } from '@/components/shell/sign-in-request';
import { signInTrouble } from '@/components/shell/sign-in-words';
import { stringMember } from '@/components/shell/string-member';

const credentials = { email: 'reviewer@tarrow.example', password: 'a b&c' };

/** Answers the form token, then `answer`; keeps what was posted. */
function office(answer: () => Response, posted: string[] = []): typeof fetch {
  return async (path, init) => {
    if (path === '/api/auth/csrf') return Response.json({ csrfToken: 'token' });
    posted.push(String(init?.body));
    return answer();
  };
}

describe('signing in', () => {
  it('posts the form token with e-mail and password', async () => {
    const posted: string[] = [];
    const result = await requestSignIn(
      credentials,
      office(() => Response.json({ url: 'http://x/' }), posted),
    );
    expect(result).toEqual({ kind: 'in' });
    const form = new URLSearchParams(posted[0]);
    expect(form.get('csrfToken')).toBe('token');
    expect(form.get('password')).toBe('a b&c');
  });

  it('tells a wrong pair from a fault', async () => {
    const refused = () => Response.json({ url: 'http://x/?error=CredentialsSignin' }, { status: 401 });
    await expect(requestSignIn(credentials, office(refused))).resolves.toEqual({ kind: 'wrong' });
    await expect(
      requestSignIn(
        credentials,
        office(() => new Response(null, { status: 500 })),
      ),
    ).resolves.toEqual({
      kind: 'failed',
    });
  });

  it('does not take an answer that leads back to the form for a success', async () => {
    const back = () => Response.json({ url: 'http://x/api/auth/signin?csrf=true' });
    await expect(requestSignIn(credentials, office(back))).resolves.toEqual({ kind: 'failed' });
  });

  it('says how long to wait, a minute when the office does not, an hour at most', async () => {
    const wait = (retryAfter?: string) => () =>
      new Response('{}', { status: 429, headers: retryAfter === undefined ? {} : { 'Retry-After': retryAfter } });
    await expect(requestSignIn(credentials, office(wait('16')))).resolves.toEqual({ kind: 'wait', seconds: 16 });
    await expect(requestSignIn(credentials, office(wait()))).resolves.toEqual({ kind: 'wait', seconds: 60 });
    await expect(requestSignIn(credentials, office(wait('99999')))).resolves.toEqual({ kind: 'wait', seconds: 3600 });
  });

  it('says that the office cannot be reached', async () => {
    const result = await requestSignIn(credentials, async () => Promise.reject(new TypeError('network')));
    expect(result).toEqual({ kind: 'unreachable' });
    expect(signInTrouble(result)).toContain('Nothing on your phone is lost');
  });

  it('has words for every trouble and none for success', () => {
    expect(signInTrouble({ kind: 'wait', seconds: 1 })).toBe('Too many attempts. Wait 1 second, then try again.');
    expect(signInTrouble({ kind: 'in' })).toBeNull();
    expect(signInTrouble(null)).toBeNull();
  });
});

describe('the page after signing in', () => {
  it('is a path of this site', () => {
    expect(pathAfterSignIn('/nests/1?reading=2')).toBe('/nests/1?reading=2');
  });

  it.each(['https://evil.test', '//evil.test', '/\\evil.test', 'javascript:alert(1)', '/a\\b', '/a b', '', undefined])(
    'is the start page instead of %s',
    (asked) => {
      expect(pathAfterSignIn(asked)).toBe('/');
    },
  );
});

describe('a member of an answer', () => {
  it('is read only when it is the answer’s own text', () => {
    expect(stringMember({ url: 'x' }, 'url')).toBe('x');
    expect(stringMember({ url: 1 }, 'url')).toBeNull();
    expect(stringMember({}, 'toString')).toBeNull();
    expect(stringMember(null, 'url')).toBeNull();
  });
});
