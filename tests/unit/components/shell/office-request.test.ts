import { expect, it } from 'vitest';
import { askToAct } from '@/components/shell/office-request';

const ACT = { path: '/api/invitations', body: { email: 'a@b.example' } };

it('sends the act as JSON with the header that a form of another site cannot set', async () => {
  const sent: RequestInit[] = [];
  const fetcher: typeof fetch = async (_path, init) => {
    sent.push(init ?? {});
    return Response.json({ id: 'x' });
  };
  expect(await askToAct(ACT, fetcher)).toEqual({ ok: true, answer: { id: 'x' } });
  expect(new Headers(sent[0]?.headers).get('x-sync')).toBe('1');
  expect(sent[0]?.body).toBe('{"email":"a@b.example"}');
});

it('brings a refusal back in words, with the time to wait', async () => {
  const refuse = (seconds: string) => async () =>
    Response.json({ title: 'Too many.', code: 'too-many' }, { status: 429, headers: { 'Retry-After': seconds } });
  expect(await askToAct(ACT, refuse('20'))).toEqual({
    ok: false,
    code: 'too-many',
    words: 'Too many. Try again in 20 s.',
  });
  expect(await askToAct(ACT, refuse('3600'))).toMatchObject({ words: 'Too many. Try again in 60 minutes.' });
});

it('never throws: no network and no JSON are answers too', async () => {
  const offline: typeof fetch = async () => {
    throw new TypeError('offline');
  };
  expect(await askToAct(ACT, offline)).toMatchObject({ ok: false, code: null });
  const page: typeof fetch = async () => new Response('<html>', { status: 502 });
  expect(await askToAct(ACT, page)).toMatchObject({ ok: false, words: expect.stringContaining('Nothing was changed') });
});
