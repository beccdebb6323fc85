import { z } from 'zod';
import { describe, expect, it, vi } from 'vitest';
import { clientAddress } from '@/lib/server/http/client-address';
import { isForeign, mayBeForged } from '@/lib/server/http/csrf';
import { parseInput } from '@/lib/server/http/parse-input';
import { HttpProblem } from '@/lib/server/http/problem';
import { clampedInteger, queryParams } from '@/lib/server/http/query-params';
import { publicUrl } from '@/lib/server/env';

function request(method: string, headers: Record<string, string> = {}): Request {
  return new Request(`${publicUrl()}/api/x`, { method, headers });
}

/** The code of the problem that a call throws. */
function codeOf(call: () => unknown): string | null {
  try {
    call();
    return null;
  } catch (error) {
    return error instanceof HttpProblem ? error.code : 'another error';
  }
}

describe('a request that another site may have made', () => {
  it.each<[string, Request, boolean]>([
    ['a read without an origin', request('GET'), false],
    ['a change with our header', request('POST', { 'x-sync': '1' }), false],
    [
      'a change from our own page',
      request('POST', { 'x-sync': '1', origin: publicUrl(), 'sec-fetch-site': 'same-origin' }),
      false,
    ],
    ['a change without our header', request('POST'), true],
    ['a deletion without our header', request('DELETE', { origin: publicUrl() }), true],
    ['a change with another value', request('POST', { 'x-sync': 'true' }), true],
    ['a read from another origin', request('GET', { origin: 'https://evil.example' }), true],
    ['a read from an opaque origin', request('GET', { origin: 'null' }), true],
    ['a read of another site', request('GET', { 'sec-fetch-site': 'cross-site' }), true],
    ['an origin that only begins like ours', request('GET', { origin: `${publicUrl()}.evil.example` }), true],
  ])('%s', (_what, made, forged) => {
    expect(mayBeForged(made)).toBe(forged);
  });

  it('is not foreign for lack of our header alone', () => {
    expect(isForeign(request('POST'))).toBe(false);
  });
});

describe('a query string', () => {
  const read = (query: string) => queryParams(`http://x/?${query}`, ['q', 'page']);

  it('gives the known parameters as texts', () => {
    expect(read('q=a%20b&page=2')).toEqual({ q: 'a b', page: '2' });
    expect(read('')).toEqual({});
    expect(read('q=')).toEqual({ q: '' });
  });

  it.each([
    ['sort=password', 'param'],
    ['q[]=a&q[]=b', 'param'],
    ['q[$ne]=a', 'param'],
    ['__proto__=1', 'param'],
    ['constructor=1', 'param'],
    ['q=1&q=2', 'dup-param'],
    ['q=&q=', 'dup-param'],
  ])('%s is refused (B35, B36, B37)', (query, code) => {
    expect(codeOf(() => read(query))).toBe(code);
  });

  it('brings whole numbers into their range', () => {
    const range = { min: 1, max: 500, otherwise: 100 };
    expect(['0', '-7', '12', '1000000000', undefined].map((text) => clampedInteger(text, range))).toEqual([
      1, 1, 12, 500, 100,
    ]);
    for (const text of ['', 'all', '1.5', '1e3', '٣', ' 1', '9'.repeat(40)])
      expect(codeOf(() => clampedInteger(text, range))).toBe('limit');
  });
});

describe('a body', () => {
  it('with a member too many is told apart from one of the wrong form', () => {
    const schema = z.strictObject({ cells: z.array(z.strictObject({ q: z.number() })) });
    expect(parseInput(schema, { cells: [{ q: 1 }] })).toEqual({ cells: [{ q: 1 }] });
    expect(codeOf(() => parseInput(schema, { cells: [], by: 'x' }))).toBe('unknown-field');
    expect(codeOf(() => parseInput(schema, { cells: [{ q: 1, z: 1 }] }))).toBe('unknown-field');
    expect(codeOf(() => parseInput(schema, { cells: [{ q: '1' }] }))).toBe('shape');
  });
});

describe('the address of a client', () => {
  const headers = new Headers({ 'x-forwarded-for': '203.0.113.7, 198.51.100.2' });

  it('is what our own proxy wrote, and nothing when there is none (B74)', () => {
    expect(clientAddress(headers)).toBe('direct');
    vi.stubEnv('TRUST_PROXY', '1');
    expect(clientAddress(headers)).toBe('198.51.100.2');
    expect(clientAddress(new Headers())).toBe('direct');
  });
});
