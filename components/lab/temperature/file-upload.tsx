'use client';

import { type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { FileQuestions } from './file-questions';
import { ReplaceChoice, type Replacing } from './replace-choice';
import type { KeptView } from './temperature-shapes';
import { UploadPreview } from './upload-preview';
import { useKeep } from '@/components/lab/use-keep';
import { type Upload, useUpload } from './use-upload';

interface FileUploadProps {
  nest: string;
  zone: string;
  /** Records in force. */
  records: readonly KeptView[];
}

const NOT_REPLACING: Replacing = { id: '', reason: '' };

function Trouble({ words }: { words: string | null }): ReactElement | null {
  if (!words) return null;
  return (
    <Notice tone="stop" live="assertive">
      <p>{words}</p>
    </Notice>
  );
}

/** The recognised file with the key that keeps it. */
function KeepFile({ upload, nest, zone, records }: FileUploadProps & { upload: Upload }): ReactElement | null {
  const [replaces, setReplaces] = useState(NOT_REPLACING);
  const { send, isSending, trouble } = useKeep(upload.reset);
  const { file, preview, answers } = upload;
  if (!file || preview?.kind !== 'read') return null;
  const isReasonMissing = replaces.id !== '' && replaces.reason.trim() === '';
  const keep = (): void => {
    const body = { text: file.text, fileName: file.name.slice(0, 200), answers };
    const replacing = replaces.id === '' ? {} : { replaces: { ...replaces, reason: replaces.reason.trim() } };
    send({ method: 'POST', path: `/api/nests/${nest}/temperature`, body: { ...body, ...replacing } });
  };
  return (
    <div className="flex flex-col gap-4">
      <UploadPreview preview={preview} zone={zone} />
      <ReplaceChoice records={records} value={replaces} onChange={setReplaces} />
      <Trouble words={trouble} />
      <div className="flex flex-wrap gap-3">
        <Button tone="main" onClick={keep} disabled={isSending || isReasonMissing}>
          {isSending ? 'Keeping …' : 'Keep this record'}
        </Button>
        <Button onClick={upload.reset}>Put it aside</Button>
      </div>
    </div>
  );
}

/** Chooses a logger's file, shows what it was recognised as, and keeps it on a second press. */
export function FileUpload(props: FileUploadProps): ReactElement {
  const upload = useUpload(props.nest);
  const { file, preview, isBusy, trouble, choose, answer } = upload;
  return (
    <div className="flex flex-col gap-4">
      <Field
        id="temperature-file"
        label="A logger’s file, or lowest and highest of each day"
        hint="Text with a column of times and one of °C or °F. Nothing is kept before you have seen what it is."
      >
        {(control) => (
          <input
            {...control}
            key={file?.name ?? 'none'}
            type="file"
            accept=".csv,.txt,.tsv,text/csv,text/plain"
            onChange={(event) => {
              const chosen = event.target.files?.[0];
              if (chosen) choose(chosen);
            }}
            className="min-h-9 w-full rounded border-2 border-edge bg-paper px-2 py-1"
          />
        )}
      </Field>
      <div aria-live="polite" className="flex flex-col gap-3">
        {file && <p className="font-bold [overflow-wrap:anywhere]">{file.name}</p>}
        {isBusy && <p>Reading the file …</p>}
        {preview?.kind === 'unreadable' && <Trouble words={preview.reason} />}
        {preview?.kind === 'questions' && <FileQuestions questions={preview.questions} onAnswer={answer} />}
        <Trouble words={trouble} />
      </div>
      <KeepFile {...props} upload={upload} />
    </div>
  );
}
