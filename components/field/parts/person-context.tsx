'use client';

import { createContext, type ReactElement, type ReactNode, useContext } from 'react';
import type { Person } from '@/lib/offline/session-view';

const PersonContext = createContext<Person | null>(null);

interface PersonProviderProps {
  person: Person;
  children: ReactNode;
}

/** Tells the screens inside whose records are open. */
export function PersonProvider({ person, children }: PersonProviderProps): ReactElement {
  return <PersonContext value={person}>{children}</PersonContext>;
}

/** The person whose records are open. Only screens behind the sign-in check may ask. */
export function usePerson(): Person {
  const person = useContext(PersonContext);
  if (!person) throw new Error('usePerson outside of PersonProvider');
  return person;
}

/** May this person record at nests? Others may look; the office would not take their marks. */
export function mayRecord({ role }: Pick<Person, 'role'>): boolean {
  return role === 'technician' || role === 'reviewer' || role === 'biologist';
}

/** The name of a member of the team, as far as this phone knows it. */
export function memberName({ members, userId, displayName }: Person, id: string): string {
  if (id === userId) return displayName;
  return members.find((member) => member.id === id)?.name ?? 'another person';
}
