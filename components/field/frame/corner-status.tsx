'use client';

import type { ReactElement } from 'react';
import { fieldHref } from '@/components/field/routing/field-route';
import { useSyncStatus } from '@/lib/offline/hooks/use-sync-status';

/** What the recorder knows before the queue does: a press on its way into storage, or one that was not kept. */
export type PressState = 'saving' | 'not-saved' | null;

interface CornerStatusProps {
  press?: PressState;
}

const PRESS_WORDS = { saving: 'saving', 'not-saved': 'not saved' } as const;

/** Capital first letter, for words that begin a line. */
const sentence = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1);

/** Where one's work is, in words and a number, always in the same corner; leads to the list of what is unsent. */
export function CornerStatus({ press = null }: CornerStatusProps): ReactElement {
  const { status, words, count } = useSyncStatus();
  const needsYou = status.kind === 'needs-you' || press === 'not-saved';
  return (
    <a
      href={fieldHref({ kind: 'unsent' })}
      className={`ml-auto flex min-h-field max-w-32 min-w-field items-center justify-end gap-2 text-right leading-tight font-bold no-underline ${needsYou ? 'text-stop' : 'text-ink'}`}
    >
      <span>{sentence(press ? PRESS_WORDS[press] : words)}</span>
      {count > 0 && !words.includes(String(count)) && (
        <span
          aria-hidden="true"
          className={`min-w-9 rounded-full px-2 py-1 text-center font-mono ${needsYou ? 'bg-stop text-stop-on' : 'bg-ink text-paper'}`}
        >
          {count}
        </span>
      )}
    </a>
  );
}
