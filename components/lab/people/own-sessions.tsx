import type { ReactElement } from 'react';
import { momentWords } from '@/components/ui/date-words';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { ConfirmAct } from './confirm-act';
import type { TimeView } from './people-shapes';

/** One's own sign-in, as the page is given it. Instants are ISO 8601 UTC. */
export interface SessionView {
  id: string;
  agent: string;
  teamName: string;
  createdAt: string;
  lastSeenAt: string;
  here: boolean;
}

interface OwnSessionsProps extends TimeView {
  sessions: readonly SessionView[];
  /** Say the team of each, for a person in several. */
  showTeams: boolean;
}

/** Where one is signed in; each sign-in can be ended, and all others at once. */
export function OwnSessions({ sessions, showTeams, zone, today }: OwnSessionsProps): ReactElement {
  return (
    <>
      <Table caption="Where you are signed in">
        <thead>
          <tr>
            <HeadCell>Browser</HeadCell>
            <HeadCell>Last used</HeadCell>
            <HeadCell>
              <span className="sr-only">Acts</span>
            </HeadCell>
          </tr>
        </thead>
        <tbody>
          {sessions.map(({ id, agent, teamName, createdAt, lastSeenAt, here }) => (
            <tr key={id}>
              <BodyCell>
                <span className="font-bold">{agent || 'A browser'}</span>
                {showTeams && <span className="block text-sm">{teamName}</span>}
                <span className="block text-sm text-quiet">since {momentWords(createdAt, zone, today)}</span>
              </BodyCell>
              <BodyCell>{here ? 'here, now' : momentWords(lastSeenAt, zone, today)}</BodyCell>
              <BodyCell>
                {!here && (
                  <div className="flex justify-end">
                    <ConfirmAct
                      words="End"
                      label={`End the sign-in of ${agent || 'a browser'}`}
                      title="End this sign-in?"
                      act="End it"
                      path={`/api/account/sessions/${id}/end`}
                    >
                      <p>Its next page asks for the password. What a phone has not sent stays on it.</p>
                    </ConfirmAct>
                  </div>
                )}
              </BodyCell>
            </tr>
          ))}
        </tbody>
      </Table>
      {sessions.length > 1 && (
        <div className="mt-4">
          <ConfirmAct
            words="End all others"
            title="End every other sign-in?"
            act="End all others"
            path="/api/account/sessions/end-others"
          >
            <p>You stay signed in here. What a phone has not sent stays on it until you sign in there again.</p>
          </ConfirmAct>
        </div>
      )}
    </>
  );
}
