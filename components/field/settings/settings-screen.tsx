'use client';

import type { ReactElement } from 'react';
import { DescriptionList } from '@/components/ui/description-list';
import { FieldFrame } from '@/components/field/frame/field-frame';
import { InstallWays } from '@/components/field/install/install-ways';
import { Part } from '@/components/field/parts/part';
import { usePerson } from '@/components/field/parts/person-context';
import { Screen } from '@/components/field/parts/screen';
import { fieldHref } from '@/components/field/routing/field-route';
import { ROLE_WORDS } from '@/components/shell/role-words';
import { useSession } from '@/lib/offline/hooks/use-session';
import type { Person, SessionView } from '@/lib/offline/session-view';
import { HandPart } from './hand-part';
import { SignOutPart } from './sign-out-part';
import { StoragePart } from './storage-part';

/** Whether the office knows this phone. */
function phoneWords(view: SessionView): string {
  const enrolled = 'enrolled' in view && view.enrolled;
  return enrolled ? 'Known to the office.' : 'Not known to the office yet. That happens by itself with signal.';
}

function WhoPart({ person, view }: { person: Person; view: SessionView }): ReactElement {
  return (
    <Part title="Who and where">
      <DescriptionList
        items={[
          { term: 'Signed in as', children: <strong>{person.displayName}</strong> },
          { term: 'Role', children: ROLE_WORDS[person.role] },
          { term: 'Team', children: person.teamName },
          { term: 'Dates and times in', children: person.zone },
          { term: 'This phone', children: phoneWords(view) },
        ]}
      />
    </Part>
  );
}

/** Who works on this phone, what it keeps, how it behaves while reading, and the way out. */
export function SettingsScreen(): ReactElement {
  const person = usePerson();
  const { view } = useSession();
  return (
    <FieldFrame back={{ href: fieldHref({ kind: 'nests' }), to: 'the nests' }} help="settings">
      <Screen title="Settings">
        <WhoPart person={person} view={view} />
        <StoragePart cleared={'storageCleared' in view && view.storageCleared} />
        <HandPart />
        <Part title="On the home screen">
          <InstallWays />
        </Part>
        <SignOutPart />
      </Screen>
    </FieldFrame>
  );
}
