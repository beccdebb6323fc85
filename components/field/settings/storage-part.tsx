'use client';

import { type ReactElement, useEffect, useState } from 'react';
import { Notice } from '@/components/ui/notice';
import { FieldButton } from '@/components/field/parts/field-button';
import { Part } from '@/components/field/parts/part';
import { keepStorage, readStorage, type StorageSpace, spaceWords } from './storage-space';

/** What the browser has promised about our records. */
function keptWords(kept: boolean | null): string {
  if (kept === null)
    return 'This browser does not say whether it may clear records by itself. Install the app to be surer.';
  return kept
    ? 'The browser keeps the records on this phone until you remove them.'
    : 'The browser may clear the records when the phone runs short of room. Ask it to keep them, or install the app.';
}

/** What this phone keeps: whether it was asked to keep it for good, and how much room is left. */
export function StoragePart({ cleared }: { cleared: boolean }): ReactElement {
  const [space, setSpace] = useState<StorageSpace | null>(null);
  useEffect(() => {
    void readStorage().then(setSpace);
  }, []);
  const ask = async (): Promise<void> => {
    await keepStorage();
    setSpace(await readStorage());
  };
  return (
    <Part title="Storage">
      {cleared && (
        <Notice tone="warn" title="The browser has cleared this phone’s storage">
          <p>What had reached the office comes back with signal. Tell your coordinator if something was unsent.</p>
        </Notice>
      )}
      <p role="status">{space ? `${keptWords(space.kept)} ${spaceWords(space.left)}` : 'Asking the browser …'}</p>
      {space?.kept === false && <FieldButton onClick={() => void ask()}>Ask to keep the records</FieldButton>}
    </Part>
  );
}
