'use client';

import { type ReactElement, useState } from 'react';
import { Notice } from '@/components/ui/notice';
import { FieldButton } from '@/components/field/parts/field-button';
import { saveFile } from '@/components/ui/save-file';
import { usePerson } from '@/components/field/parts/person-context';
import { TextLine } from '@/components/field/parts/text-line';
import { useToday } from '@/components/field/words/use-today';
import type { Outbox } from '@/lib/offline/hooks/use-outbox';
import { useSession } from '@/lib/offline/hooks/use-session';

/** What has to be typed before anything is deleted. */
const WORD = 'delete';

type Copied = { state: 'none' | 'failed' } | { state: 'made'; opIds: ReadonlySet<string> };

/** The copy that has to be made before anything may be deleted. */
function useCopy(outbox: Outbox) {
  const today = useToday(usePerson().zone);
  const [copied, setCopied] = useState<Copied>({ state: 'none' });
  const copy = async (): Promise<void> => {
    try {
      const { file, opIds } = await outbox.exportAll();
      saveFile(file, `undereave-unsent-${today}.json`);
      setCopied({ state: 'made', opIds });
    } catch {
      setCopied({ state: 'failed' });
    }
  };
  return { copied, copy };
}

/** The typed word and the key that deletes; shown only once there is a copy. */
function TypedDelete({ opIds }: { opIds: ReadonlySet<string> }): ReactElement {
  const { signOutAndDelete } = useSession();
  const [typed, setTyped] = useState('');
  const [wrong, setWrong] = useState(false);
  const leave = (): void => {
    const right = typed.trim().toLowerCase() === WORD;
    setWrong(!right);
    if (right) void signOutAndDelete(opIds).catch(() => undefined);
  };
  return (
    <>
      <TextLine
        id="delete-word"
        label={`Type the word ${WORD}`}
        hint="Look first that the copy is among the downloads and opens elsewhere. It is then the only one."
        value={typed}
        onChange={setTyped}
        maxLength={20}
        error={wrong ? `Nothing is deleted before the word ${WORD} stands here.` : null}
      />
      <FieldButton tone="stop" onClick={leave}>
        Delete here and sign out
      </FieldButton>
    </>
  );
}

/** Handing the unsent work over as a file and taking it off this phone: copy first, then a typed word. */
export function DeleteHere({ outbox }: { outbox: Outbox }): ReactElement {
  const { copied, copy } = useCopy(outbox);
  return (
    <div className="flex flex-col gap-gap">
      <p>
        The copy is one file. You open it on another phone or at a desk, under <em>Unsent</em>, signed in as yourself.
      </p>
      <FieldButton onClick={() => void copy()}>1. Make the copy</FieldButton>
      <p role="status">
        {copied.state === 'made' && 'The copy is among this phone’s downloads.'}
        {copied.state === 'failed' && 'No copy could be made. Nothing is deleted. Try again.'}
      </p>
      {copied.state === 'made' ? (
        <TypedDelete opIds={copied.opIds} />
      ) : (
        <Notice>
          <p>2. Deleting comes after the copy.</p>
        </Notice>
      )}
    </div>
  );
}
