import type { ReactElement } from 'react';
import { Notice } from '@/components/ui/notice';

/** What the office said no to, read out at once; nothing while all is well. */
export function FormTrouble({ words }: { words: string | null }): ReactElement | null {
  if (words === null) return null;
  return (
    <Notice tone="stop" live="assertive">
      <p>{words}</p>
    </Notice>
  );
}
