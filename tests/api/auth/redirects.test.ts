import { beforeAll, describe, expect, it, vi } from 'vitest';
import { publicUrl } from '@/lib/server/env';
import { type Account, PASSWORD, makeAccount } from '@/tests/support/auth/account';
import { Browser } from '@/tests/support/auth/browser';
import { problemOf } from '@/tests/support/factories/call-api';
import { makeTeam } from '@/tests/support/factories/make-team';

vi.mock('@/lib/server/log/log', () => ({ log: () => undefined, describeError: () => ({}) }));

const OWN = publicUrl();
let account: Account;

beforeAll(async () => {
  account = await makeAccount((await makeTeam()).teamId);
});

const EVIL = [
  '//evil.tld',
  'https:evil',
  '/\\evil',
  '\\\\evil',
  'javascript:alert(1)',
  'data:text/html,x',
  'http://evil.tld',
  `${OWN}.evil.tld`,
  `${OWN}@evil.tld`,
  'http://127.0.0.1:1/',
  'http://',
  'http://[::1',
  '%',
  '',
  '\u0000',
];

describe('where a sign-in leads (B70)', () => {
  it.each(EVIL)('%j stays on the own origin, in form, query and cookie, and never fails', async (callbackUrl) => {
    const form = await new Browser().signIn(account.email, PASSWORD, { form: { callbackUrl } });
    expect(form.status).toBe(200);
    expect(new URL(((await form.json()) as { url: string }).url).origin).toBe(OWN);
    const query = await new Browser().call('GET', 'signin', {
      query: `?callbackUrl=${encodeURIComponent(callbackUrl)}`,
    });
    expect(query.status).toBe(302);
    const location = new URL(query.headers.get('location') ?? '', OWN);
    expect([location.origin, location.pathname]).toEqual([OWN, '/sign-in']);
    expect(new URL(location.searchParams.get('callbackUrl') ?? OWN).origin).toBe(OWN);
    const cookie = `next-auth.callback-url=${encodeURIComponent(callbackUrl)}`;
    expect((await new Browser().call('GET', 'signin', { headers: { cookie } })).status).toBe(302);
    const out = await new Browser().call('POST', 'signout', { form: { csrfToken: 'x', callbackUrl } });
    expect(out.status).toBe(302);
  });

  it('an own page is kept', async () => {
    const response = await new Browser().signIn(account.email, PASSWORD, { form: { callbackUrl: '/nests?page=2' } });
    expect(await response.json()).toEqual({ url: `${OWN}/nests?page=2` });
  });
});

describe('other addresses under /api/auth', () => {
  it.each([
    ['GET', 'nothing', [404, 'not-found']],
    ['GET', 'callback/credentials', [405, 'method']],
    ['GET', 'callback/evil', [404, 'not-found']],
    ['POST', 'signin/credentials', [404, 'not-found']],
    ['POST', '_log', [404, 'not-found']],
    ['PUT', 'session', [405, 'method']],
  ] as const)('%s %s is a problem, not a failure', async (method, path, expected) => {
    const form = method === 'GET' ? undefined : { x: '1' };
    expect(await problemOf(await new Browser().call(method, path, { form }))).toEqual(expected);
  });

  it.each(['csrf', 'providers', 'session', 'signin', 'signout', 'error'])('GET %s answers', async (path) => {
    const response = await new Browser().call('GET', path);
    expect(response.status).toBeLessThan(400);
    expect(response.headers.get('cache-control')).toBe('no-store');
  });

  it.each<[string, { type: string; body: string }, [number, string]]>([
    ['a text', { type: 'text/plain', body: 'x' }, [415, 'content-type']],
    ['JSON cut off', { type: 'application/json', body: '{' }, [400, 'json']],
    ['a JSON list', { type: 'application/json', body: '[]' }, [400, 'shape']],
    ['an e-mail that is a list', { type: 'application/json', body: '{"email":["a","b"]}' }, [400, 'shape']],
    [
      'a password twice',
      { type: 'application/x-www-form-urlencoded', body: 'password=a&password=b' },
      [400, 'dup-param'],
    ],
    ['17 KB', { type: 'application/x-www-form-urlencoded', body: 'x'.repeat(17_000) }, [413, 'body']],
  ])('a sign-in with %s is refused', async (_what, { type, body }, expected) => {
    const response = await new Browser().call('POST', 'callback/credentials', {
      body,
      headers: { 'content-type': type },
    });
    expect(await problemOf(response)).toEqual(expected);
  });

  it('requests of other sites are refused (B71)', async () => {
    const foreign: Record<string, string>[] = [
      { origin: 'https://evil.example' },
      { 'sec-fetch-site': 'cross-site' },
      { origin: 'null' },
    ];
    for (const headers of foreign) {
      const response = await new Browser().call('POST', 'callback/credentials', { form: {}, headers });
      expect(await problemOf(response)).toEqual([403, 'csrf']);
    }
  });
});
