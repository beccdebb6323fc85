import { describe, expect, it } from 'vitest';
import { type Change, requestChange } from '@/components/lab/bench/change-request';

const change: Change = { reading: 'r1', act: 'lock', body: {} };
const answering = (status: number, body: unknown) => async () => Response.json(body, { status });

describe('asking the office for a change of a reading', () => {
  it('posts JSON with the header that no foreign page can send', async () => {
    const sent: Request[] = [];
    const fetcher: typeof fetch = async (path, init) => {
      sent.push(new Request(`http://office.test${String(path)}`, init));
      return Response.json({ reading: 'final', version: 1 });
    };
    await expect(requestChange(change, fetcher)).resolves.toEqual({ ok: true, reading: 'final' });
    expect(sent[0]?.url).toBe('http://office.test/api/readings/r1/lock');
    expect(sent[0]?.method).toBe('POST');
    expect(sent[0]?.headers.get('X-Sync')).toBe('1');
    await expect(sent[0]?.json()).resolves.toEqual({});
  });

  it('passes on what the office says is wrong', async () => {
    const title = 'The reading is locked. Amend it to make a new version.';
    await expect(requestChange(change, answering(409, { title }))).resolves.toEqual({ ok: false, words: title });
  });

  it('says that nothing was stored when the answer says nothing', async () => {
    const result = await requestChange(change, async () => new Response('<html>', { status: 502 }));
    expect(result).toMatchObject({ ok: false, words: expect.stringContaining('Nothing was stored') });
  });

  it('says so when the office cannot be reached', async () => {
    const result = await requestChange(change, async () => Promise.reject(new TypeError('network')));
    expect(result).toMatchObject({ ok: false, words: expect.stringContaining('cannot be reached') });
  });
});
