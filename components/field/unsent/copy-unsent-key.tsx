'use client';

import { type ReactElement, useState } from 'react';
import { FieldButton } from '@/components/field/parts/field-button';
import { saveFile } from '@/components/ui/save-file';
import { usePerson } from '@/components/field/parts/person-context';
import { useToday } from '@/components/field/words/use-today';
import { useOutbox } from '@/lib/offline/hooks/use-outbox';

/** Makes a file of everything that is not at the office, to hand over by cable or message. Nothing is removed. */
export function CopyUnsentKey({ children }: { children: string }): ReactElement {
  const outbox = useOutbox();
  const today = useToday(usePerson().zone);
  const [state, setState] = useState<'ready' | 'made' | 'failed'>('ready');
  const copy = async (): Promise<void> => {
    if (!outbox) return;
    try {
      saveFile(await outbox.exportUnsent(), `undereave-unsent-${today}.json`);
      setState('made');
    } catch {
      setState('failed');
    }
  };
  return (
    <div className="flex flex-col gap-1">
      <FieldButton onClick={() => void copy()}>{children}</FieldButton>
      <p role="status">
        {state === 'made' && 'The copy is among this phone’s downloads. Nothing was removed here.'}
        {state === 'failed' && 'No copy could be made. Try again.'}
      </p>
    </div>
  );
}
