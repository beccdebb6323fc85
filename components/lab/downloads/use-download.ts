import { useRef, useState } from 'react';
import { saveFile } from '@/components/ui/save-file';
import { type DownloadProgress, fetchFile } from './fetch-file';

/** What a row of the downloads table knows about its download. */
export interface DownloadHandle {
  start: (address: string) => Promise<void>;
  stop: () => void;
  /** Null while nothing is fetched. */
  progress: DownloadProgress | null;
  /** How the last download ended; null before and while one runs. */
  ended: { ok: boolean; words: string } | null;
}

/** Fetches a file and hands it to the person, with progress; one at a time. */
export function useDownload(name: string): DownloadHandle {
  const [progress, setProgress] = useState<DownloadProgress | null>(null);
  const [ended, setEnded] = useState<DownloadHandle['ended']>(null);
  const running = useRef<AbortController | null>(null);
  const start = async (address: string): Promise<void> => {
    if (running.current) return;
    const controller = new AbortController();
    running.current = controller;
    setEnded(null);
    setProgress({ bytes: 0, rows: 0 });
    const result = await fetchFile(address, { fetcher: fetch, onProgress: setProgress, signal: controller.signal });
    running.current = null;
    setProgress(null);
    if (result.ok) saveFile(result.file, name);
    setEnded(result.ok ? { ok: true, words: `${name} is among your downloads.` } : { ok: false, words: result.words });
  };
  return { start, stop: () => running.current?.abort(), progress, ended };
}
