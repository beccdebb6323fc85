import { describe, expect, test, vi } from 'vitest';
import { httpNetwork } from '@/lib/offline/http-network';

function answering(response: () => Response | Promise<Response>) {
  const fetch = vi.fn<typeof globalThis.fetch>(async () => response());
  vi.stubGlobal('fetch', fetch);
  return fetch;
}

const ASK = { method: 'GET', path: '/api/health', timeoutMs: 1_000 } as const;

describe('a request', () => {
  test('says that it is ours, from which device, and is never answered from a cache', async () => {
    const fetch = answering(() => new Response('{}'));
    await httpNetwork.send({
      method: 'POST',
      path: '/api/sync/v1/push',
      body: '{}',
      deviceId: 'd-1',
      timeoutMs: 1_000,
    });
    expect(fetch).toHaveBeenCalledWith(
      '/api/sync/v1/push',
      expect.objectContaining({
        method: 'POST',
        body: '{}',
        cache: 'no-store',
        credentials: 'same-origin',
        redirect: 'manual',
        headers: { 'X-Sync': '1', 'X-Device': 'd-1', 'Content-Type': 'application/json', Accept: 'application/json' },
      }),
    );
  });

  test('tells how much the phone still holds, but not before the office knows the phone', async () => {
    const fetch = answering(() => new Response('{}'));
    await httpNetwork.send({ ...ASK, deviceId: 'd-1', unsent: 7 });
    await httpNetwork.send({ ...ASK, deviceId: null, unsent: 7 });
    const said = fetch.mock.calls.map(([, init]) => new Headers(init?.headers).get('X-Unsent'));
    expect(said).toEqual(['7', null]);
  });

  test('without a device or a body says nothing about them', async () => {
    const fetch = answering(() => new Response('{}'));
    await httpNetwork.send(ASK);
    expect(fetch.mock.calls[0]?.[1]?.headers).toEqual({ 'X-Sync': '1', Accept: 'application/json' });
  });
});

describe('an answer', () => {
  test('is handed on as it came', async () => {
    answering(
      () => new Response('busy', { status: 503, headers: { 'Content-Type': 'text/plain', 'Retry-After': '7' } }),
    );
    expect(await httpNetwork.send(ASK)).toEqual({
      kind: 'answer',
      status: 503,
      contentType: 'text/plain',
      text: 'busy',
      retryAfterMs: 7_000,
    });
  });

  test.each(['soon', '-3', '1e9', 'Wed, 21 Oct 2026 07:28:00 GMT'])('does not ask to wait for "%s"', async (header) => {
    answering(() => new Response('', { status: 503, headers: { 'Retry-After': header } }));
    expect(await httpNetwork.send(ASK)).toMatchObject({ retryAfterMs: null });
  });

  test('that breaks off is none', async () => {
    const broken = new ReadableStream({ start: (controller) => controller.error(new Error('cut')) });
    answering(() => new Response(broken));
    expect(await httpNetwork.send(ASK)).toEqual({ kind: 'none', why: 'network' });
  });

  test('that does not come is none, with the reason', async () => {
    answering(() => Promise.reject(new TypeError('Failed to fetch')));
    expect(await httpNetwork.send(ASK)).toEqual({ kind: 'none', why: 'network' });
    vi.stubGlobal(
      'fetch',
      (_path: string, { signal }: { signal: AbortSignal }) =>
        new Promise((_resolve, reject) => signal.addEventListener('abort', () => reject(new Error('aborted')))),
    );
    expect(await httpNetwork.send({ ...ASK, timeoutMs: 5 })).toEqual({ kind: 'none', why: 'timeout' });
  });
});
