'use client';

import type { ReactElement } from 'react';
import { clockWords } from '@/components/field/words/clock-words';
import { readMeta } from '@/lib/offline/dexie-store';
import { useRead } from '@/lib/offline/hooks/use-read';

/** Says that the phone's clock is off, as the office measured it. Nothing is refused for that. */
export function ClockNotice(): ReactElement | null {
  const meta = useRead(readMeta, ['meta']);
  const words = clockWords(meta?.skewMs ?? null);
  if (words === null) return null;
  return (
    <section aria-label="Clock" className="print-hidden border-b-2 border-warn bg-warn-wash px-gap py-4">
      <p>
        <strong>{words}</strong> Set it in the phone’s settings. What you record keeps the time this phone shows, and
        the office notes the difference.
      </p>
    </section>
  );
}
