'use client';

import type { ReactElement } from 'react';
import { HeadCell, Table } from '@/components/ui/table';
import { DOWNLOAD_FILES, type DownloadFilter } from './download-files';
import { DownloadRow } from './downloads/download-row';
import { useRowCounts } from './downloads/use-row-counts';

/** Every file with its rows and its two forms under the filter of the page. */
export function DownloadsTable({ filter }: { filter: DownloadFilter }): ReactElement {
  const counts = useRowCounts(filter);
  return (
    <Table caption="Files to download">
      <thead>
        <tr>
          <HeadCell>File</HeadCell>
          <HeadCell>Take it away</HeadCell>
        </tr>
      </thead>
      <tbody>
        {DOWNLOAD_FILES.map((file) => (
          <DownloadRow key={file.name} file={file} filter={filter} counts={counts} />
        ))}
      </tbody>
    </Table>
  );
}
