'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { AccountLine } from '@/components/shell/account/account-line';
import { FormTrouble } from '@/components/shell/account/form-trouble';
import { NewPasswordField, passwordTrouble } from '@/components/shell/account/new-password-field';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';
import { Notice } from '@/components/ui/notice';
import { usePageAct } from './use-page-act';

/** Changes one's own password; the sign-in it happens in goes on. */
export function PasswordForm({ email }: { email: string }): ReactElement {
  const [current, setCurrent] = useState('');
  const [password, setPassword] = useState('');
  const [isDone, setDone] = useState(false);
  const { send, isSending, trouble, setTrouble } = usePageAct();
  const change = async (event: FormEvent): Promise<void> => {
    event.preventDefault();
    setDone(false);
    const wrong = passwordTrouble(password);
    if (wrong !== null) return setTrouble(wrong);
    const result = await send({ path: '/api/account/password', body: { current, password } });
    if (!result.ok) return;
    setDone(true);
    setCurrent('');
    setPassword('');
  };
  return (
    <form onSubmit={(event) => void change(event)} aria-label="Change the password" className="flex flex-col gap-4">
      <FormTrouble words={trouble} />
      <div role="status">{isDone && <Notice>The new password stands. All your other sign-ins were ended.</Notice>}</div>
      <AccountLine email={email} />
      <Field id="current-password" label="Present password" required>
        {(control) => (
          <Input
            {...control}
            type="password"
            autoComplete="current-password"
            maxLength={1024}
            className="min-h-12"
            value={current}
            onChange={(event) => setCurrent(event.target.value)}
          />
        )}
      </Field>
      <NewPasswordField value={password} onChange={setPassword} />
      <Button type="submit" tone="main" className="self-start" disabled={isSending}>
        {isSending ? 'Changing …' : 'Change the password'}
      </Button>
    </form>
  );
}
