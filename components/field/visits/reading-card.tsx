'use client';

import type { ReactElement } from 'react';
import { tallyWords } from '@/components/comb/comb-view';
import { countWords } from '@/components/ui/date-words';
import { CombThumb } from '@/components/field/nests/comb-thumb';
import { memberName, usePerson } from '@/components/field/parts/person-context';
import { fieldHref } from '@/components/field/routing/field-route';
import { readingState, readingTitle } from '@/components/field/words/reading-words';
import { writtenTime } from '@/components/field/words/written-time';
import { useReading } from '@/lib/offline/hooks/use-reading';
import type { ReadingSummary } from '@/lib/offline/nest-view';

interface ReadingCardProps {
  reading: ReadingSummary;
  today: string;
}

/** What the reading holds so far, in words. */
function Contents({ id }: { id: string }): ReactElement | null {
  const reading = useReading(id);
  if (!reading || reading.blind) return null;
  const cells = countWords(reading.tally.cellsTotal, 'cell');
  return (
    <span className="flex flex-wrap items-center justify-between gap-x-4">
      <span className="min-w-0 flex-1 basis-40">{[cells, ...tallyWords(reading.tally)].join(', ')}</span>
      <CombThumb marks={reading.marks} />
    </span>
  );
}

/** One reading of a visit: whose it is, how it was made, how far it has come. */
export function ReadingCard({ reading, today }: ReadingCardProps): ReactElement {
  const person = usePerson();
  const title = readingTitle(reading, memberName(person, reading.observer));
  return (
    <li>
      <a
        href={fieldHref({ kind: 'reading', id: reading.id })}
        className="flex min-h-key flex-col [overflow-wrap:anywhere] gap-1 rounded-xl border-3 border-ink bg-paper p-4 text-ink no-underline hover:bg-wash"
      >
        <span className="font-bold">{title}</span>
        <span className="text-quiet">
          {writtenTime(reading.openedAt, today)} · {readingState(reading)}
        </span>
        {reading.blind ? <span>Hidden until you hand in your second reading</span> : <Contents id={reading.id} />}
      </a>
    </li>
  );
}
