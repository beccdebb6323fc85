import { stringMember } from '@/components/shell/string-member';
import { rowCounter } from './row-counter';

/** How far a download is. */
export interface DownloadProgress {
  bytes: number;
  /** Rows below the header; without meaning for an archive. */
  rows: number;
}

/** What came of a download. */
export type DownloadResult = { ok: true; file: Blob } | { ok: false; words: string };

const UNREACHABLE = 'The office cannot be reached, or the connection broke. Nothing was kept; try again.';

/** What a download needs beside its address. */
export interface DownloadPorts {
  fetcher: typeof fetch;
  onProgress: (progress: DownloadProgress) => void;
  signal: AbortSignal;
}

async function collect(body: ReadableStream<Uint8Array<ArrayBuffer>>, onProgress: DownloadPorts['onProgress']) {
  const parts: Uint8Array<ArrayBuffer>[] = [];
  const counter = rowCounter();
  let bytes = 0;
  const reader = body.getReader();
  for (;;) {
    const { done, value } = await reader.read();
    if (done) return parts;
    parts.push(value);
    bytes += value.length;
    onProgress({ bytes, rows: Math.max(0, counter.take(value) - 1) });
  }
}

/** Fetches a file while telling how far it is. Never throws: what failed comes back in words. */
export async function fetchFile(
  address: string,
  { fetcher, onProgress, signal }: DownloadPorts,
): Promise<DownloadResult> {
  try {
    const answer = await fetcher(address, { signal });
    if (!answer.ok || !answer.body) {
      return { ok: false, words: stringMember(await answer.json().catch(() => null), 'title') ?? UNREACHABLE };
    }
    return { ok: true, file: new Blob(await collect(answer.body, onProgress)) };
  } catch {
    return { ok: false, words: signal.aborted ? 'Stopped. Nothing was kept.' : UNREACHABLE };
  }
}
