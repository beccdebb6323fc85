'use client';

import type { ReactElement } from 'react';
import { countWords } from '@/components/ui/date-words';
import { fieldHref } from '@/components/field/routing/field-route';
import { readingState, visitsWords } from '@/components/field/words/reading-words';
import { writtenTime } from '@/components/field/words/written-time';
import { useReading } from '@/lib/offline/hooks/use-reading';
import type { NestSummary, ReadingView } from '@/lib/offline/nest-view';
import { CombThumb } from './comb-thumb';

interface NestCardProps {
  nest: NestSummary;
  today: string;
}

/** What is said about the last reading of a nest: `33 cells · handed in, at the office`. */
function lastReadingWords(reading: ReadingView): string {
  if (reading.blind) return 'Hidden until you hand in your second reading';
  return `${countWords(reading.tally.cellsTotal, 'cell')} · ${readingState(reading)}`;
}

/** The card of a nest whose last reading is known. */
function CardWithReading({ nest, today, readingId }: NestCardProps & { readingId: string }): ReactElement {
  const reading = useReading(readingId) ?? null;
  return (
    <CardFrame
      nest={nest}
      today={today}
      picture={reading && !reading.blind ? <CombThumb marks={reading.marks} /> : null}
    >
      {reading ? lastReadingWords(reading) : 'Opening …'}
    </CardFrame>
  );
}

interface CardFrameProps extends NestCardProps {
  picture: ReactElement | null;
  /** What is said about its last reading. */
  children: string;
}

function CardFrame({ nest, today, picture, children }: CardFrameProps): ReactElement {
  const visited = nest.lastVisitAt ? `Last visit ${writtenTime(nest.lastVisitAt, today)}` : visitsWords(nest.visits);
  return (
    <li>
      <a
        href={fieldHref({ kind: 'nest', id: nest.id })}
        className="flex h-full min-h-key items-start gap-4 rounded-xl border-3 border-ink bg-paper p-4 text-ink no-underline hover:bg-wash"
      >
        <span className="min-w-0 flex-1 [overflow-wrap:anywhere]">
          <span className="block text-[1.375rem] leading-snug font-bold">{nest.name ?? nest.code}</span>
          <span className="block text-quiet">
            {nest.name && `${nest.code} · `}
            {visited}
          </span>
          <span className="mt-1 block">{children}</span>
          {nest.waiting > 0 && <span className="block font-bold">{nest.waiting} waiting to send</span>}
          {nest.standing === 'not-accepted' && <span className="block font-bold text-stop">Needs you: see unsent</span>}
        </span>
        {picture}
      </a>
    </li>
  );
}

/** A nest in the list: what it is called, when it was last seen, what was in it and where the records are. */
export function NestCard({ nest, today }: NestCardProps): ReactElement {
  if (nest.lastReadingId === null) {
    return (
      <CardFrame nest={nest} today={today} picture={null}>
        No reading yet
      </CardFrame>
    );
  }
  return <CardWithReading nest={nest} today={today} readingId={nest.lastReadingId} />;
}
