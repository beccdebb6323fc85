import { describe, expect, it } from 'vitest';
import { type DownloadProgress, fetchFile } from '@/components/lab/downloads/fetch-file';
import { rowCounter } from '@/components/lab/downloads/row-counter';

const bytes = (text: string) => new TextEncoder().encode(text);

function ports(fetcher: typeof fetch) {
  const seen: DownloadProgress[] = [];
  const signal = new AbortController().signal;
  return { seen, ports: { fetcher, onProgress: (progress: DownloadProgress) => void seen.push(progress), signal } };
}

describe('rows of a file that arrives in pieces', () => {
  it('are counted across pieces, and line breaks inside quotes are none', () => {
    const counter = rowCounter();
    expect(counter.take(bytes('a,b\r\n1,"two\r'))).toBe(1);
    expect(counter.take(bytes('\nlines"\r\n'))).toBe(2);
    expect(counter.take(bytes('2,"say ""so"""\r\n'))).toBe(3);
  });
});

describe('a download', () => {
  it('tells how far it is and gives the whole file', async () => {
    const { seen, ports: given } = ports(async () => new Response('a\r\n1\r\n2\r\n'));
    const result = await fetchFile('/api/export/nests.csv', given);
    expect(result.ok && (await result.file.text())).toBe('a\r\n1\r\n2\r\n');
    expect(seen.at(-1)).toEqual({ bytes: 9, rows: 2 });
  });

  it('says in words what the office refused', async () => {
    const refusal = () => Response.json({ title: 'There is nothing here.' }, { status: 404 });
    const result = await fetchFile('/api/export/x.csv', ports(async () => refusal()).ports);
    expect(result).toEqual({ ok: false, words: 'There is nothing here.' });
  });

  it('that breaks off keeps nothing and says so', async () => {
    const broken = new ReadableStream({
      pull(controller) {
        controller.error(new Error('gone'));
      },
    });
    const result = await fetchFile('/api/export/cells.csv', ports(async () => new Response(broken)).ports);
    expect(result.ok ? '' : result.words).toMatch(/Nothing was kept/);
  });

  it('that was stopped says so', async () => {
    const controller = new AbortController();
    controller.abort();
    const fetcher = async () => Promise.reject(new DOMException('stopped', 'AbortError'));
    const result = await fetchFile('/x', { fetcher, onProgress: () => undefined, signal: controller.signal });
    expect(result).toEqual({ ok: false, words: 'Stopped. Nothing was kept.' });
  });
});
