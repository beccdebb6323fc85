import { once } from 'node:events';
import { type IncomingMessage, request } from 'node:http';
import { expect, test } from '@playwright/test';
import { origin } from '@/tests/support/running-server';

/** Sends a request with a method that browsers and `fetch` refuse to send. */
async function send(method: string, path: string) {
  const call = request(`${origin()}${path}`, { method, headers: { cookie: 'canary=do-not-echo' } }).end();
  const [response] = (await once(call, 'response')) as [IncomingMessage];
  const chunks: Buffer[] = [];
  for await (const chunk of response) chunks.push(chunk as Buffer);
  return { status: response.statusCode, headers: response.headers, body: Buffer.concat(chunks).toString() };
}

test.describe('TRACE', () => {
  for (const path of ['/', '/nests', '/field', '/api/health', '/api/sync/v1/push', '/_next/static/none.js']) {
    test(`is not taken at ${path}, and nothing is echoed (B75)`, async () => {
      const { status, headers, body } = await send('TRACE', path);
      expect(status).toBe(405);
      expect(headers['content-type']).toBe('application/problem+json');
      expect(JSON.parse(body)).toMatchObject({ code: 'method', status: 405 });
      expect(body).not.toContain('canary');
    });
  }
});
