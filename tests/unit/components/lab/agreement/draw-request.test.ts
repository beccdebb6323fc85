import { expect, it } from 'vitest';
import { requestDraw } from '@/components/lab/agreement/draw-request';

it('a month that was drawn is no trouble', async () => {
  const sent: unknown[] = [];
  const fetcher = (async (address: string, init?: RequestInit) => {
    sent.push([address, init?.body]);
    return Response.json({ month: '2026-06' });
  }) as typeof fetch;
  expect(await requestDraw('2026-06', fetcher)).toBeNull();
  expect(sent).toEqual([['/api/samples', '{"month":"2026-06"}']]);
});

it('what the office refused, or that it cannot be reached, is said in words', async () => {
  const refuses = async () => Response.json({ title: 'Your role may not do this.' }, { status: 403 });
  expect(await requestDraw('2026-06', refuses)).toBe('Your role may not do this.');
  const gone = async () => Promise.reject(new TypeError('no network'));
  expect(await requestDraw('2026-06', gone)).toMatch(/cannot be reached/);
});
