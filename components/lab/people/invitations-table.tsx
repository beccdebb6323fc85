'use client';

import { type ReactElement, useState } from 'react';
import { FormTrouble } from '@/components/shell/account/form-trouble';
import { ROLE_WORDS } from '@/components/shell/role-words';
import { stringMember } from '@/components/shell/string-member';
import { Button } from '@/components/ui/button';
import { momentWords } from '@/components/ui/date-words';
import { Notice } from '@/components/ui/notice';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import { ConfirmAct } from './confirm-act';
import { letterWords } from './letter-words';
import type { InvitationView, TimeView } from './people-shapes';
import { usePageAct } from './use-page-act';

interface InvitationsTableProps extends TimeView {
  invitations: readonly InvitationView[];
}

/** How an invitation stands: what a coordinator must know to act. */
function Standing({ invitation, zone, today }: { invitation: InvitationView } & TimeView): ReactElement {
  const { expired, sent, expiresAt } = invitation;
  const until = momentWords(expiresAt, zone, today);
  if (!sent) return <span className="font-bold text-stop">The letter did not go out</span>;
  return expired ? <span className="text-warn">Ran out on {until}</span> : <span>Open until {until}</span>;
}

interface ActsProps {
  invitation: InvitationView;
  disabled: boolean;
  onAgain: (invitation: InvitationView) => Promise<void>;
}

/** What can be done about an invitation. */
function Acts({ invitation, disabled, onAgain }: ActsProps): ReactElement {
  return (
    <div className="flex flex-wrap justify-end gap-2">
      <Button
        aria-label={`Send again to ${invitation.email}`}
        disabled={disabled}
        onClick={() => void onAgain(invitation)}
      >
        Send again
      </Button>
      <ConfirmAct
        words="Take back"
        label={`Take back the invitation of ${invitation.email}`}
        title="Take this invitation back?"
        act="Take it back"
        path={`/api/invitations/${invitation.id}/withdraw`}
      >
        <p>The link in the letter to {invitation.email} stops working at once.</p>
      </ConfirmAct>
    </div>
  );
}

/** Who is asked to join and has not answered; each can be asked again or no longer. */
export function InvitationsTable({ invitations, ...time }: InvitationsTableProps): ReactElement {
  const [news, setNews] = useState<string | null>(null);
  const { send, isSending, trouble } = usePageAct();
  const again = async ({ id, email }: InvitationView): Promise<void> => {
    setNews(null);
    const result = await send({ path: `/api/invitations/${id}/renew`, body: {} });
    if (result.ok) setNews(letterWords(stringMember(result.answer, 'letter'), email));
  };
  return (
    <>
      <FormTrouble words={trouble} />
      <div role="status">{news !== null && <Notice className="mb-3">{news}</Notice>}</div>
      <Table caption="Open invitations">
        <thead>
          <tr>
            <HeadCell>E-mail</HeadCell>
            <HeadCell className="max-sm:hidden">Standing</HeadCell>
            <HeadCell>
              <span className="sr-only">Acts</span>
            </HeadCell>
          </tr>
        </thead>
        <tbody>
          {invitations.map((invitation) => (
            <tr key={invitation.id}>
              <BodyCell className="[overflow-wrap:anywhere]">
                {invitation.email}
                <span className="block text-sm text-quiet">{ROLE_WORDS[invitation.role]}</span>
                <span className="block text-sm sm:hidden">
                  <Standing invitation={invitation} {...time} />
                </span>
              </BodyCell>
              <BodyCell className="max-sm:hidden">
                <Standing invitation={invitation} {...time} />
              </BodyCell>
              <BodyCell>
                <Acts invitation={invitation} disabled={isSending} onAgain={again} />
              </BodyCell>
            </tr>
          ))}
        </tbody>
      </Table>
    </>
  );
}
