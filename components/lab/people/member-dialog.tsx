'use client';

import { type ReactElement, useState } from 'react';
import { FormTrouble } from '@/components/shell/account/form-trouble';
import type { RoleName } from '@/components/shell/role-words';
import { Button } from '@/components/ui/button';
import { countWords } from '@/components/ui/date-words';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import type { MemberView } from './people-shapes';
import { RoleSelect } from './role-select';
import { usePageAct } from './use-page-act';

/** What a coordinator may do about a member. */
type MemberAct = 'role' | 'sign-out' | 'end';

interface PartProps {
  title: string;
  children: string;
  act: ReactElement;
}

function Part({ title, children, act }: PartProps): ReactElement {
  return (
    <section className="border-t border-rule pt-3">
      <h3 className="font-bold">{title}</h3>
      <p className="mb-2 text-sm text-quiet">{children}</p>
      {act}
    </section>
  );
}

/** Two presses, because only a new invitation takes it back. */
function EndButtons({ isSending, onEnd }: { isSending: boolean; onEnd: () => void }): ReactElement {
  const [isAsked, setAsked] = useState(false);
  if (!isAsked) {
    return (
      <Button tone="stop" onClick={() => setAsked(true)}>
        End the membership …
      </Button>
    );
  }
  return (
    <div role="group" aria-label="End the membership?" className="flex flex-wrap items-center gap-3">
      <p role="status">Only a new invitation takes it back.</p>
      <Button autoFocus tone="stop" disabled={isSending} onClick={onEnd}>
        End it
      </Button>
      <Button onClick={() => setAsked(false)}>Leave it</Button>
    </div>
  );
}

/** Role, sign-ins and membership of one person, each with what follows from it. */
export function MemberDialog({ member }: { member: MemberView }): ReactElement {
  const [isOpen, setOpen] = useState(false);
  const [role, setRole] = useState<RoleName>(member.role);
  const { send, isSending, trouble } = usePageAct();
  const act = async (what: MemberAct): Promise<void> => {
    const body = what === 'role' ? { role } : {};
    const result = await send({ path: `/api/members/${member.id}/${what}`, body });
    if (!result.ok) return;
    setOpen(false);
    if (what === 'end') document.getElementById('main')?.focus();
  };
  return (
    <>
      <Button aria-label={`Change ${member.name}`} onClick={() => setOpen(true)}>
        Change
      </Button>
      <Dialog open={isOpen} onClose={() => setOpen(false)} title={member.name}>
        <div className="flex flex-col gap-4">
          <FormTrouble words={trouble} />
          <div className="flex flex-wrap items-end gap-3">
            <Field id={`role-${member.id}`} label="Role" hint="Counts from the next page on." className="min-w-52 grow">
              {(control) => <RoleSelect control={control} value={role} onChoose={setRole} />}
            </Field>
            <Button tone="main" disabled={isSending || role === member.role} onClick={() => void act('role')}>
              Give this role
            </Button>
          </div>
          <Part
            title="Sign-ins"
            act={
              <Button disabled={isSending || member.sessions === 0} onClick={() => void act('sign-out')}>
                Sign out everywhere
              </Button>
            }
          >
            {`Signed in ${countWords(member.sessions, 'time')} to this team. Ended at once; what a phone has not sent stays on it.`}
          </Part>
          <Part title="Membership" act={<EndButtons isSending={isSending} onEnd={() => void act('end')} />}>
            Every sign-in to this team ends at once. What this person recorded stays, under their name.
          </Part>
          <Button className="self-start" onClick={() => setOpen(false)}>
            Close
          </Button>
        </div>
      </Dialog>
    </>
  );
}
