'use client';

import type { ReactElement } from 'react';
import { FieldButton, FieldLink } from '@/components/field/parts/field-button';
import { BroodPreview } from '@/components/field/brood/brood-preview';
import { nestTitle } from '@/components/field/nests/nest-lists';
import { Fetching } from '@/components/field/parts/fetching';
import { NotOnThisPhone } from '@/components/field/parts/not-here';
import { Part } from '@/components/field/parts/part';
import { memberName, usePerson } from '@/components/field/parts/person-context';
import { Screen } from '@/components/field/parts/screen';
import { fieldHref } from '@/components/field/routing/field-route';
import { readingState, readingTitle } from '@/components/field/words/reading-words';
import { useToday } from '@/components/field/words/use-today';
import { writtenTime } from '@/components/field/words/written-time';
import { useNest } from '@/lib/offline/hooks/use-nest';
import { useReading } from '@/lib/offline/hooks/use-reading';
import type { ReadingView } from '@/lib/offline/nest-view';
import { ReadingHistory } from './reading-history';
import { ReadingMap } from './reading-map';

interface ReadOnlyProps {
  id: string;
  /** Opens the recorder again on the person's own reading; null on anybody else's. */
  onCorrect: (() => void) | null;
}

function ReadOnlyBody({
  reading,
  onCorrect,
}: {
  reading: ReadingView;
  onCorrect: ReadOnlyProps['onCorrect'];
}): ReactElement {
  const person = usePerson();
  const nest = useNest(reading.nest);
  const today = useToday(person.zone);
  return (
    <Screen
      title={readingTitle(reading, memberName(person, reading.observer))}
      under={`${nest ? `${nestTitle(nest)} · ` : ''}${writtenTime(reading.openedAt, today)} · ${readingState(reading)}`}
    >
      <FieldLink tone="main" href={fieldHref({ kind: 'visit', id: reading.visit })}>
        To the visit
      </FieldLink>
      <Part title="The comb">
        <ReadingMap reading={reading} />
        {!reading.mine && !reading.blind && (
          <p className="text-quiet">You can look at this reading. Only its reader can change it.</p>
        )}
      </Part>
      {!reading.blind && (
        <BroodPreview nest={reading.nest} reading={reading.id} taxon={nest?.taxon ?? null} marks={reading.marks} />
      )}
      {!reading.blind && <FieldButton onClick={() => window.print()}>Print the comb</FieldButton>}
      {onCorrect && <FieldButton onClick={onCorrect}>Correct a cell</FieldButton>}
      <ReadingHistory reading={reading} today={today} />
    </Screen>
  );
}

/** A reading that is handed in, or another person's: to look at. */
export function ReadOnly({ id, onCorrect }: ReadOnlyProps): ReactElement {
  const reading = useReading(id);
  if (reading === undefined) return <Fetching what="Reading" />;
  if (reading === null) return <NotOnThisPhone what="reading" />;
  return <ReadOnlyBody reading={reading} onCorrect={onCorrect} />;
}
