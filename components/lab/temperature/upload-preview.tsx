import type { ReactElement } from 'react';
import { DescriptionList } from '@/components/ui/description-list';
import { Disclosure } from '@/components/ui/disclosure';
import { Notice } from '@/components/ui/notice';
import { layoutWords } from './layout-words';
import type { PreviewView } from './temperature-shapes';

interface UploadPreviewProps {
  preview: Extract<PreviewView, { kind: 'read' }>;
  zone: string;
}

/** What a file was recognised as, with everything strange in it, before it is kept. */
export function UploadPreview({ preview, zone }: UploadPreviewProps): ReactElement {
  const { notes, warnings } = preview;
  return (
    <div className="flex flex-col gap-3">
      <DescriptionList items={layoutWords(preview, zone)} />
      {notes.length > 0 && (
        <Disclosure summary="The strange lines">
          <ul className="flex flex-col gap-1 text-sm">
            {notes.map(({ line, text }) => (
              <li key={`${line} ${text}`}>{text}</li>
            ))}
          </ul>
        </Disclosure>
      )}
      {warnings.length > 0 && (
        <Notice tone="warn" title="In this record">
          <ul>
            {warnings.map((text) => (
              <li key={text}>{text}</li>
            ))}
          </ul>
        </Notice>
      )}
    </div>
  );
}
