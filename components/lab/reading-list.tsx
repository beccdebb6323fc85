import Link from 'next/link';
import type { ReactElement } from 'react';
import { TallyLine } from '@/components/comb/tally-line';
import { momentWords } from '@/components/ui/date-words';
import { sentence } from '@/components/ui/sentence';
import type { ReadingRow, VisitRow } from './lab-shapes';
import { kindWords, purposeWords, readingStanding } from './lab-words';

interface ReadingListProps {
  nest: string;
  visits: readonly VisitRow[];
  /** The reading the page shows now. */
  shown: string | null;
  zone: string;
  year: string;
  /** Does the reader settle readings? Then each leads to the bench by that name. */
  settles: boolean;
}

function ReadingItem({
  nest,
  reading,
  shown,
  settles,
}: { reading: ReadingRow } & Omit<ReadingListProps, 'visits' | 'zone' | 'year'>): ReactElement {
  const isShown = reading.id === shown;
  return (
    <li className={`border-l-[6px] py-1.5 pl-3 ${isShown ? 'border-main bg-main-wash' : 'border-rule'}`}>
      <p className="flex flex-wrap items-baseline gap-x-3">
        <Link
          href={`/nests/${nest}?reading=${reading.id}`}
          scroll={false}
          aria-current={isShown ? 'true' : undefined}
          className="inline-flex min-h-6 items-center font-bold underline decoration-edge underline-offset-4 hover:decoration-ink"
        >
          {sentence(kindWords(reading.kind))} by {reading.observer}
        </Link>
        <span className="text-quiet">{readingStanding(reading)}</span>
        <Link
          href={`/nests/${nest}/readings/${reading.id}`}
          className="print-hidden inline-flex min-h-6 items-center text-main underline underline-offset-4"
        >
          {settles ? 'Open at the bench' : 'Cell by cell'}
          <span className="sr-only">
            : {kindWords(reading.kind)} by {reading.observer}
          </span>
        </Link>
      </p>
      {reading.tally ? (
        <TallyLine tally={reading.tally} className="text-[0.9375rem]" />
      ) : (
        <p className="text-[0.9375rem] text-quiet">Hidden until your own second reading is handed in.</p>
      )}
    </li>
  );
}

/** The visits of a nest, latest first, each with its readings: the switch between what the comb shows. */
export function ReadingList({ visits, zone, year, ...rest }: ReadingListProps): ReactElement {
  const latestFirst = [...visits].sort((a, b) => Date.parse(b.startedAt) - Date.parse(a.startedAt));
  return (
    <ol className="flex flex-col gap-4">
      {latestFirst.map((visit) => (
        <li key={visit.id} className="keep-together">
          <h3 className="mb-1 font-bold">
            {purposeWords(visit.purpose)}, {momentWords(visit.startedAt, zone, year)}
          </h3>
          {visit.readings.length === 0 ? (
            <p className="text-quiet">No reading at this visit.</p>
          ) : (
            <ul className="flex flex-col gap-2">
              {visit.readings.map((reading) => (
                <ReadingItem key={reading.id} reading={reading} {...rest} />
              ))}
            </ul>
          )}
        </li>
      ))}
    </ol>
  );
}
