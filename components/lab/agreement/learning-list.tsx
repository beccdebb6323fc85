import type { ReactElement } from 'react';
import { countWords } from '@/components/ui/date-words';
import { Disclosure } from '@/components/ui/disclosure';
import type { PersonNotesView } from './agreement-shapes';

function Notes({ person }: { person: PersonNotesView }): ReactElement {
  const { stood, cells, readings, notes } = person;
  return (
    <div className="max-w-text">
      <p>
        In {countWords(readings, 'locked reading')} the state stood as read at the nest in <strong>{stood}</strong> of{' '}
        {countWords(cells, 'cell')}.
      </p>
      {notes.length === 0 ? (
        <p className="mt-2">Nothing was settled otherwise: there is nothing to add.</p>
      ) : (
        <ul className="mt-3 flex flex-col gap-3">
          {notes.map(({ read, settled, words }) => (
            <li key={`${read} ${settled}`} className="border-l-[6px] border-main bg-main-wash px-4 py-2">
              {words}
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}

/** What readers can learn from their locked readings: the own notes open, those of others one tap away. */
export function LearningList({ people }: { people: readonly PersonNotesView[] }): ReactElement {
  return (
    <div className="flex flex-col gap-5">
      {people.map((person) =>
        person.own ? (
          <Notes key={person.key} person={person} />
        ) : (
          <Disclosure key={person.key} summary={`Notes for ${person.name}`}>
            <p className="mb-2 text-sm text-quiet">Shown to {person.name} and to the lead biologist, to nobody else.</p>
            <Notes person={person} />
          </Disclosure>
        ),
      )}
    </div>
  );
}
