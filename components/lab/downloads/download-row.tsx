'use client';

import type { MouseEvent, ReactElement } from 'react';
import { type DownloadFile, type DownloadFilter, downloadAddress } from '@/components/lab/download-files';
import { Button } from '@/components/ui/button';
import { buttonLook } from '@/components/ui/button-look';
import { countWords } from '@/components/ui/date-words';
import { BodyCell } from '@/components/ui/table';
import type { RowCounts } from './use-row-counts';
import { type DownloadHandle, useDownload } from './use-download';

const FORM_WORDS = { exact: 'Exact', spreadsheet: 'For a spreadsheet' } as const;

interface FileLinkProps {
  file: DownloadFile;
  address: string;
  form: keyof typeof FORM_WORDS;
  start: DownloadHandle['start'];
}

/** A plain link, so that it works without script and can be copied; a plain press shows progress. */
function FileLink({ file, address, form, start }: FileLinkProps): ReactElement {
  const onClick = (event: MouseEvent): void => {
    if (event.ctrlKey || event.metaKey || event.shiftKey || event.altKey) return;
    event.preventDefault();
    void start(address);
  };
  return (
    <a
      href={address}
      download={file.name}
      onClick={onClick}
      className={buttonLook('plain', 'lab', 'whitespace-nowrap')}
    >
      {FORM_WORDS[form]}
      <span className="sr-only">: {file.name}</span>
    </a>
  );
}

/** How many rows a file will have, before it is fetched. */
function rowsWords(file: DownloadFile, { rows, isTroubled }: RowCounts): string {
  if (file.name.endsWith('.zip')) return 'all files';
  if (isTroubled) return 'not counted';
  return rows ? countWords(rows[file.name] ?? 0, 'row') : 'counting…';
}

function progressWords({ name }: DownloadFile, { progress }: DownloadHandle, total: number | undefined): string {
  if (!progress) return '';
  if (name.endsWith('.zip')) return `${Math.ceil(progress.bytes / 1024)} kB`;
  return total === undefined ? countWords(progress.rows, 'row') : `${progress.rows} of ${countWords(total, 'row')}`;
}

interface DownloadRowProps {
  file: DownloadFile;
  filter: DownloadFilter;
  counts: RowCounts;
}

/** One file: what it holds, how many rows, its two forms, and how far its download is. */
export function DownloadRow({ file, filter, counts }: DownloadRowProps): ReactElement {
  const download = useDownload(file.name);
  const { progress, ended } = download;
  const total = counts.rows?.[file.name];
  return (
    <tr>
      <BodyCell className="max-w-text py-3">
        <p className="font-bold">
          {file.title} <span className="font-mono font-normal text-quiet">{file.name}</span>
        </p>
        <p>{file.holds}</p>
        <p className="text-sm text-quiet">{rowsWords(file, counts)}</p>
      </BodyCell>
      <BodyCell className="py-3">
        {progress ? (
          <div className="flex flex-wrap items-center gap-3">
            <progress
              aria-label={`Download of ${file.name}`}
              value={total === undefined ? undefined : progress.rows}
              max={total === undefined ? undefined : Math.max(1, total)}
            />
            <span className="font-mono text-sm">{progressWords(file, download, total)}</span>
            <Button onClick={download.stop}>Stop</Button>
          </div>
        ) : (
          <div className="flex flex-wrap gap-2">
            {(['exact', 'spreadsheet'] as const).map((form) => (
              <FileLink
                key={form}
                file={file}
                form={form}
                address={downloadAddress(file, filter, form)}
                start={download.start}
              />
            ))}
          </div>
        )}
        <p role="status" className={`text-sm ${ended?.ok === false ? 'text-stop' : 'text-quiet'}`}>
          {ended?.words}
        </p>
      </BodyCell>
    </tr>
  );
}
