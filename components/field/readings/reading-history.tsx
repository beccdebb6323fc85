import type { ReactElement } from 'react';
import { Disclosure } from '@/components/ui/disclosure';
import { writtenTime } from '@/components/field/words/written-time';
import type { ReadingView } from '@/lib/offline/nest-view';

/** Every mark and every change of mind, newest first. Nothing is ever written over. */
export function ReadingHistory({ reading, today }: { reading: ReadingView; today: string }): ReactElement | null {
  if (reading.history.length === 0) return null;
  return (
    <Disclosure size="field" summary={`History (${reading.history.length})`}>
      <ol className="flex flex-col gap-1">
        {reading.history.map((entry) => (
          <li key={entry.opId}>
            {entry.words} <span className="text-quiet">· {writtenTime(entry.at, today)}</span>
          </li>
        ))}
      </ol>
    </Disclosure>
  );
}
