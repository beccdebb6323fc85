'use client';

import type { ReactElement } from 'react';
import { FieldButton, FieldLink } from '@/components/field/parts/field-button';
import { FieldFrame } from '@/components/field/frame/field-frame';
import { Fetching } from '@/components/field/parts/fetching';
import { NotOnThisPhone } from '@/components/field/parts/not-here';
import { Part } from '@/components/field/parts/part';
import { mayRecord, memberName, usePerson } from '@/components/field/parts/person-context';
import { RowLink } from '@/components/field/parts/row-link';
import { Screen } from '@/components/field/parts/screen';
import { ReadingMap } from '@/components/field/readings/reading-map';
import { fieldHref } from '@/components/field/routing/field-route';
import { progressWords, purposeWord } from '@/components/field/words/reading-words';
import { useToday } from '@/components/field/words/use-today';
import { writtenTime } from '@/components/field/words/written-time';
import { useNest } from '@/lib/offline/hooks/use-nest';
import { useReading } from '@/lib/offline/hooks/use-reading';
import type { NestView, VisitView } from '@/lib/offline/nest-view';
import { nestTitle } from './nest-lists';

/** The comb as the last reading has it. */
function LastMap({ readingId }: { readingId: string }): ReactElement {
  const reading = useReading(readingId);
  const person = usePerson();
  const today = useToday(person.zone);
  if (!reading)
    return <p className="text-quiet">{reading === null ? 'The last reading is not on this phone.' : 'Opening …'}</p>;
  const mine = reading.mine ? 'you' : memberName(person, reading.observer);
  return (
    <>
      <p className="text-quiet">
        Read {writtenTime(reading.openedAt, today)} by {mine}
      </p>
      <ReadingMap reading={reading} />
    </>
  );
}

/** The person's own reading of this nest that is not handed in yet. */
function openReadingOf(nest: NestView): string | null {
  const readings = nest.visitList.flatMap((visit) => visit.readings);
  return readings.findLast((reading) => reading.mine && reading.submittedAt === null)?.id ?? null;
}

function VisitRow({ visit, today }: { visit: VisitView; today: string }): ReactElement {
  const readings = visit.readings.length;
  const handedIn = visit.readings.filter((reading) => reading.submittedAt !== null).length;
  return (
    <RowLink
      href={fieldHref({ kind: 'visit', id: visit.id })}
      title={`${purposeWord(visit.purpose)}, ${writtenTime(visit.startedAt, today)}`}
    >
      {readings === 0 ? 'No reading yet' : `Readings handed in: ${progressWords(handedIn, readings)}`}
      {visit.standing === 'waiting' && ' · waiting to send'}
      {visit.standing === 'not-accepted' && ' · needs you'}
    </RowLink>
  );
}

function NestBody({ nest }: { nest: NestView }): ReactElement {
  const person = usePerson();
  const today = useToday(person.zone);
  const open = openReadingOf(nest);
  return (
    <Screen title={nestTitle(nest)} under={nest.taxon ? <em>{nest.taxon}</em> : 'Taxon not named yet'}>
      {open && (
        <FieldLink tone="main" href={fieldHref({ kind: 'reading', id: open })} className="text-xl">
          Go on reading
        </FieldLink>
      )}
      {mayRecord(person) && (
        <FieldLink
          tone={open ? 'plain' : 'main'}
          href={fieldHref({ kind: 'new-visit', id: nest.id })}
          className="text-xl"
        >
          Start a visit
        </FieldLink>
      )}
      <Part title="The comb">
        {nest.lastReadingId ? (
          <LastMap readingId={nest.lastReadingId} />
        ) : (
          <p>No reading yet. Start a visit, then read the cells.</p>
        )}
      </Part>
      <div className="print-hidden flex flex-wrap gap-gap">
        {nest.lastReadingId && <FieldButton onClick={() => window.print()}>Print the comb</FieldButton>}
        <FieldLink href={fieldHref({ kind: 'sheet', id: nest.id })}>Paper sheet</FieldLink>
      </div>
      <Part title="Visits">
        {nest.visitList.length === 0 && <p>No visit yet.</p>}
        {nest.visitList.toReversed().map((visit) => (
          <VisitRow key={visit.id} visit={visit} today={today} />
        ))}
      </Part>
    </Screen>
  );
}

/** One nest: its comb as last read, its visits, and the key that starts another. */
export function NestScreen({ id }: { id: string }): ReactElement {
  const nest = useNest(id);
  return (
    <FieldFrame back={{ href: fieldHref({ kind: 'nests' }), to: 'the nests' }} help="nest">
      {nest === undefined && <Fetching what="Nest" />}
      {nest === null && <NotOnThisPhone what="nest" />}
      {nest && <NestBody nest={nest} />}
    </FieldFrame>
  );
}
