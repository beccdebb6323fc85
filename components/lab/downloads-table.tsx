import type { ReactElement } from 'react';
import { buttonLook } from '@/components/ui/button-look';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { DOWNLOAD_FILES, downloadAddress, type DownloadFile, type DownloadFilter } from './download-files';

interface FileLinkProps {
  file: DownloadFile;
  filter: DownloadFilter;
  form: 'exact' | 'spreadsheet';
}

const FORM_WORDS = { exact: 'Exact', spreadsheet: 'For a spreadsheet' } as const;

function FileLink({ file, filter, form }: FileLinkProps): ReactElement {
  return (
    <a
      href={downloadAddress(file, filter, form)}
      download={file.name}
      className={buttonLook('plain', 'lab', 'whitespace-nowrap')}
    >
      {FORM_WORDS[form]}
      <span className="sr-only">: {file.name}</span>
    </a>
  );
}

/** Every file with its two forms under the filter of the page. */
export function DownloadsTable({ filter }: { filter: DownloadFilter }): ReactElement {
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
          <tr key={file.name}>
            <BodyCell className="max-w-text py-3">
              <p className="font-bold">
                {file.title} <span className="font-mono font-normal text-quiet">{file.name}</span>
              </p>
              <p>{file.holds}</p>
            </BodyCell>
            <BodyCell className="py-3">
              <div className="flex flex-wrap gap-2">
                <FileLink file={file} filter={filter} form="exact" />
                <FileLink file={file} filter={filter} form="spreadsheet" />
              </div>
            </BodyCell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
