import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { classifyAnswer } from '@/lib/offline/classify-answer';
import type { NetworkAnswer } from '@/lib/offline/network';
import { jsonAnswer, problemAnswer } from '@/tests/support/sim/scripted-network';

const SHAPE = z.object({ protocol: z.literal(1), value: z.number() });

const kindOf = (answer: NetworkAnswer) => classifyAnswer(answer, SHAPE).kind;

function page(status: number, text = '<html>Welcome</html>', contentType = 'text/html; charset=utf-8'): NetworkAnswer {
  return { kind: 'answer', status, contentType, text, retryAfterMs: null };
}

describe('an answer counts', () => {
  test('only when it is JSON of the expected form with status 200', () => {
    expect(classifyAnswer(jsonAnswer(200, { protocol: 1, value: 7 }), SHAPE)).toEqual({
      kind: 'ok',
      value: { protocol: 1, value: 7 },
    });
  });

  test.each([
    ['HTML of a captive portal (F11)', page(200)],
    ['HTML that calls itself JSON', page(200, '<html>', 'application/json')],
    ['JSON that calls itself text', page(200, '{"protocol":1,"value":7}', 'text/plain')],
    ['a half answer (F03)', page(200, '{"protocol":1,"val', 'application/json')],
    ['another service (F12)', jsonAnswer(200, { ok: true })],
    ['another protocol', jsonAnswer(200, { protocol: 2, value: 7 })],
    ['a list', page(200, '[]', 'application/json')],
    ['nothing', page(200, '', 'application/json')],
    ['a redirect that was not followed', page(0, '', '')],
    ['a sign-in page', page(302)],
    ['network authentication required', page(511)],
    ['a router that refuses', page(403)],
    ['a router that wants a password', page(401)],
    ['a missing page', page(404)],
    ['JSON 401 of somebody else', jsonAnswer(401, { error: 'no' })],
    ['HTML 400 of a proxy', page(400)],
  ])('not when it is %s', (_what, answer) => {
    expect(kindOf(answer)).toBe('again');
  });
});

describe('a refusal of our office', () => {
  test.each([
    [401, 'signin', 'sign-in'],
    [403, 'device-revoked', 'revoked'],
    [403, 'role', 'role'],
    [409, 'epoch-mismatch', 'epoch'],
    [410, 'gone', 'restart'],
    [426, 'client-too-old', 'update'],
    [400, 'json', 'bad-batch'],
    [400, 'shape', 'bad-batch'],
    [413, 'batch', 'bad-batch'],
    [415, 'content-type', 'bad-batch'],
    [500, 'internal', 'server-error'],
    [503, 'busy', 'again'],
    [429, 'too-many', 'again'],
  ])('with status %i and code %s means %s', (status, code, kind) => {
    expect(kindOf(problemAnswer(status, code))).toBe(kind);
  });

  test('tells the new epoch when it says so', () => {
    const named = classifyAnswer(problemAnswer(409, 'epoch-mismatch', { epoch: 4 }), SHAPE);
    expect(named).toEqual({ kind: 'epoch', epoch: 4 });
    expect(classifyAnswer(problemAnswer(409, 'epoch-mismatch'), SHAPE)).toEqual({ kind: 'epoch', epoch: null });
  });

  test('a body that a proxy finds too large is halved whatever the proxy answers', () => {
    expect(kindOf(page(413))).toBe('bad-batch');
  });
});

describe('what is tried again', () => {
  test('tells a slow line from a dead one', () => {
    expect(classifyAnswer({ kind: 'none', why: 'timeout' }, SHAPE)).toMatchObject({ trouble: 'no-answer', slow: true });
    expect(classifyAnswer({ kind: 'none', why: 'network' }, SHAPE)).toMatchObject({
      trouble: 'no-answer',
      slow: false,
    });
  });

  test.each([408, 425, 429, 502, 503, 504])('status %i is an office, or its door, that is busy', (status) => {
    expect(classifyAnswer(page(status), SHAPE)).toMatchObject({ kind: 'again', trouble: 'office-busy' });
  });

  test('waits as long as a busy office asks', () => {
    const answer: NetworkAnswer = { kind: 'answer', status: 503, contentType: '', text: '', retryAfterMs: 9_000 };
    expect(classifyAnswer(answer, SHAPE)).toMatchObject({ afterMs: 9_000 });
  });
});
