'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { FormTrouble } from '@/components/shell/account/form-trouble';
import type { RoleName } from '@/components/shell/role-words';
import { stringMember } from '@/components/shell/string-member';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';
import { Notice } from '@/components/ui/notice';
import { letterWords } from './letter-words';
import { RoleSelect } from './role-select';
import { usePageAct } from './use-page-act';

/** Asks somebody into the team by e-mail, with a role. */
export function InviteForm(): ReactElement {
  const [email, setEmail] = useState('');
  const [role, setRole] = useState<RoleName>('technician');
  const [news, setNews] = useState<string | null>(null);
  const { send, isSending, trouble } = usePageAct();
  const invite = async (event: FormEvent): Promise<void> => {
    event.preventDefault();
    setNews(null);
    const result = await send({ path: '/api/invitations', body: { email, role } });
    if (!result.ok) return;
    setNews(letterWords(stringMember(result.answer, 'letter'), email.trim()));
    setEmail('');
  };
  return (
    <form onSubmit={(event) => void invite(event)} aria-label="Invite somebody" className="flex flex-col gap-3">
      <FormTrouble words={trouble} />
      <div className="flex flex-wrap items-end gap-3">
        <Field id="invite-email" label="E-mail" required className="min-w-56 grow sm:max-w-80">
          {(control) => (
            <Input
              {...control}
              type="email"
              autoComplete="off"
              maxLength={200}
              value={email}
              onChange={(event) => setEmail(event.target.value)}
            />
          )}
        </Field>
        <Field id="invite-role" label="Role" className="min-w-56 grow sm:max-w-96">
          {(control) => <RoleSelect control={control} value={role} onChoose={setRole} />}
        </Field>
        <Button type="submit" tone="main" disabled={isSending}>
          {isSending ? 'Inviting …' : 'Invite'}
        </Button>
      </div>
      <div role="status">{news !== null && <Notice>{news}</Notice>}</div>
    </form>
  );
}
