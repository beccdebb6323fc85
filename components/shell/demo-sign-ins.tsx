import type { ReactElement } from 'react';
import { roleWords } from './role-words';

/** A sign-in of the invented demo season. */
export interface DemoSignIn {
  email: string;
  password: string;
  name: string;
  role: string;
  team: string;
}

interface DemoSignInsProps {
  people: readonly DemoSignIn[];
  /** Fills the form with this sign-in. */
  onTake: (person: DemoSignIn) => void;
}

/** The invented people of the demo season, listed only where it was loaded. A press fills the form. */
export function DemoSignIns({ people, onTake }: DemoSignInsProps): ReactElement | null {
  if (people.length === 0) return null;
  return (
    <section aria-labelledby="demo-people" className="mt-8">
      <h2 id="demo-people" className="border-b border-ink pb-1 font-bold">
        Demo season: invented people
      </h2>
      <ul>
        {people.map((person) => (
          <li key={person.email}>
            <button
              type="button"
              onClick={() => onTake(person)}
              className="flex min-h-11 w-full flex-wrap items-baseline gap-x-3 border-b border-rule py-2 text-left hover:bg-wash"
            >
              <span className="font-bold">{person.name}</span>
              <span>{roleWords(person.role)}</span>
              <span className="text-sm text-quiet">
                {person.email}, {person.team}
              </span>
            </button>
          </li>
        ))}
      </ul>
      <p className="mt-2 text-sm text-quiet">A press fills the form above; then sign in.</p>
    </section>
  );
}
