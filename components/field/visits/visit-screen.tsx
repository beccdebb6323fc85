'use client';

import { type ReactElement, useState } from 'react';
import { FieldButton, FieldLink } from '@/components/field/parts/field-button';
import { FieldFrame } from '@/components/field/frame/field-frame';
import { nestTitle } from '@/components/field/nests/nest-lists';
import { Fetching } from '@/components/field/parts/fetching';
import { NotOnThisPhone } from '@/components/field/parts/not-here';
import { Part } from '@/components/field/parts/part';
import { mayRecord, memberName, usePerson } from '@/components/field/parts/person-context';
import { Screen } from '@/components/field/parts/screen';
import { fieldHref } from '@/components/field/routing/field-route';
import { purposeWord } from '@/components/field/words/reading-words';
import { useToday } from '@/components/field/words/use-today';
import { writtenTime } from '@/components/field/words/written-time';
import { useNest } from '@/lib/offline/hooks/use-nest';
import { useVisit } from '@/lib/offline/hooks/use-visit';
import type { VisitView } from '@/lib/offline/nest-view';
import { ReadingCard } from './reading-card';
import { StartReading } from './start-reading';

/** The key that begins a reading, or goes on with the person's own open one. */
function ReadingKey({ visit }: { visit: VisitView }): ReactElement {
  const [starting, setStarting] = useState(false);
  const open = visit.readings.find((reading) => reading.mine && reading.submittedAt === null);
  const hasOwn = visit.readings.some((reading) => reading.mine);
  return (
    <>
      {open && (
        <FieldLink tone="main" href={fieldHref({ kind: 'reading', id: open.id })} className="text-xl">
          Go on reading
        </FieldLink>
      )}
      {!open && (
        <FieldButton tone={hasOwn ? 'plain' : 'main'} onClick={() => setStarting(true)} className="text-xl">
          Start reading
        </FieldButton>
      )}
      <StartReading visit={visit} open={starting} onClose={() => setStarting(false)} />
    </>
  );
}

function VisitBody({ visit }: { visit: VisitView }): ReactElement {
  const person = usePerson();
  const nest = useNest(visit.nest);
  const today = useToday(person.zone);
  const who = visit.observer === person.userId ? 'you' : memberName(person, visit.observer);
  return (
    <Screen
      title={`${purposeWord(visit.purpose)}, ${writtenTime(visit.startedAt, today)}`}
      under={`${nest ? `${nestTitle(nest)} · ` : ''}started by ${who}`}
    >
      {mayRecord(person) && <ReadingKey visit={visit} />}
      <Part title="Readings">
        {visit.readings.length === 0 && <p>No reading yet. Two people at the nest make one each.</p>}
        <ul className="flex flex-col gap-gap">
          {visit.readings.map((reading) => (
            <ReadingCard key={reading.id} reading={reading} today={today} />
          ))}
        </ul>
      </Part>
    </Screen>
  );
}

/** One visit: its readings beside each other, never merged, and the key that starts one. */
export function VisitScreen({ id }: { id: string }): ReactElement {
  const visit = useVisit(id);
  const back = visit
    ? { href: fieldHref({ kind: 'nest', id: visit.nest }), to: 'the nest' }
    : { href: fieldHref({ kind: 'nests' }), to: 'the nests' };
  return (
    <FieldFrame back={back} help="visit">
      {visit === undefined && <Fetching what="Visit" />}
      {visit === null && <NotOnThisPhone what="visit" />}
      {visit && <VisitBody visit={visit} />}
    </FieldFrame>
  );
}
