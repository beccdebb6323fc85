'use client';

import type { ReactElement } from 'react';
import { FormTrouble } from '@/components/shell/account/form-trouble';
import { useAct } from '@/components/shell/use-act';
import { Button } from '@/components/ui/button';

interface OwnTeamsProps {
  teams: readonly { id: string; name: string; here: boolean }[];
}

/** The teams of a person in several, to step from one into another. */
export function OwnTeams({ teams }: OwnTeamsProps): ReactElement {
  const { send, isSending, trouble } = useAct();
  const enter = async (team: string): Promise<void> => {
    // A full load: everything on the page, and the phone app, belongs to one team.
    if ((await send({ path: '/api/account/team', body: { team } })).ok) window.location.assign('/');
  };
  return (
    <>
      <FormTrouble words={trouble} />
      <ul>
        {teams.map(({ id, name, here }) => (
          <li key={id} className="flex flex-wrap items-center justify-between gap-3 border-b border-rule py-1.5">
            <span className={here ? 'font-bold' : ''}>
              {name}
              {here && ', you are here'}
            </span>
            {!here && (
              <Button disabled={isSending} onClick={() => void enter(id)}>
                Go to this team
              </Button>
            )}
          </li>
        ))}
      </ul>
    </>
  );
}
