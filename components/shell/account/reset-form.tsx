'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { stringMember } from '@/components/shell/string-member';
import { useAct } from '@/components/shell/use-act';
import { DoneThenSignIn } from './done-then-sign-in';
import { FormTrouble } from './form-trouble';
import { NewPasswordField, passwordTrouble } from './new-password-field';

/** Sets a new password by the link of a letter. */
export function ResetForm({ token }: { token: string }): ReactElement {
  const [password, setPassword] = useState('');
  const [email, setEmail] = useState<string | null>(null);
  const { send, isSending, trouble, setTrouble } = useAct();
  const set = async (event: FormEvent): Promise<void> => {
    event.preventDefault();
    const wrong = passwordTrouble(password);
    if (wrong !== null) return setTrouble(wrong);
    const result = await send({ path: '/api/password/reset', body: { token, password } });
    if (result.ok) setEmail(stringMember(result.answer, 'email') ?? '');
  };
  if (email !== null) return <DoneThenSignIn title="The new password stands" email={email} />;
  return (
    <form onSubmit={(event) => void set(event)} className="flex flex-col gap-4" aria-label="New password">
      <FormTrouble words={trouble} />
      <NewPasswordField value={password} onChange={setPassword} />
      <p className="text-sm text-quiet">
        You are then signed out on every phone and computer. What a phone has not sent stays on it.
      </p>
      <Button type="submit" tone="main" className="min-h-12" disabled={isSending}>
        {isSending ? 'Setting …' : 'Set the password'}
      </Button>
    </form>
  );
}
