'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';
import { useAct } from '@/components/shell/use-act';
import { AccountLine } from './account-line';
import { FormTrouble } from './form-trouble';
import { NewPasswordField, passwordTrouble } from './new-password-field';
import { DoneThenSignIn } from './done-then-sign-in';

interface JoinFormProps {
  /** The secret of the link. */
  token: string;
  email: string;
  teamName: string;
  /** Has the address an account? Then its own password is asked for, not a new one. */
  hasAccount: boolean;
}

function NameField({ value, onChange }: { value: string; onChange: (value: string) => void }): ReactElement {
  return (
    <Field id="person-name" label="Your name" hint="It stands beside what you record." required>
      {(control) => (
        <Input
          {...control}
          autoComplete="name"
          maxLength={200}
          className="min-h-12"
          value={value}
          onChange={(event) => onChange(event.target.value)}
        />
      )}
    </Field>
  );
}

function OwnPasswordField({ value, onChange }: { value: string; onChange: (value: string) => void }): ReactElement {
  return (
    <Field id="password" label="Your password" hint="The one you sign in with already. It stays." required>
      {(control) => (
        <Input
          {...control}
          type="password"
          autoComplete="current-password"
          maxLength={1024}
          className="min-h-12"
          value={value}
          onChange={(event) => onChange(event.target.value)}
        />
      )}
    </Field>
  );
}

/** Answers an invitation: a name and a password, or the password of the account there is. */
export function JoinForm({ token, email, teamName, hasAccount }: JoinFormProps): ReactElement {
  const [name, setName] = useState('');
  const [password, setPassword] = useState('');
  const [isMember, setMember] = useState(false);
  const { send, isSending, trouble, setTrouble } = useAct();
  const join = async (event: FormEvent): Promise<void> => {
    event.preventDefault();
    const wrong = hasAccount ? null : passwordTrouble(password);
    if (wrong !== null) return setTrouble(wrong);
    const body = { token, name: hasAccount ? null : name, password };
    if ((await send({ path: '/api/invitation/accept', body })).ok) setMember(true);
  };
  if (isMember) return <DoneThenSignIn title={`You are a member of ${teamName}`} email={email} />;
  return (
    <form onSubmit={(event) => void join(event)} className="flex flex-col gap-4" aria-label="Join the team">
      <FormTrouble words={trouble} />
      <AccountLine email={email} />
      {hasAccount ? (
        <OwnPasswordField value={password} onChange={setPassword} />
      ) : (
        <>
          <NameField value={name} onChange={setName} />
          <NewPasswordField label="Choose a password" value={password} onChange={setPassword} />
        </>
      )}
      <Button type="submit" tone="main" className="min-h-12" disabled={isSending}>
        {isSending ? 'Joining …' : `Join ${teamName}`}
      </Button>
    </form>
  );
}
