'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';
import { Notice } from '@/components/ui/notice';
import { useAct } from '@/components/shell/use-act';
import { FormTrouble } from './form-trouble';

/** Asks for a letter with a link to a new password. The answer is the same whether or not there is an account. */
export function ForgottenForm(): ReactElement {
  const [email, setEmail] = useState('');
  const [asked, setAsked] = useState<string | null>(null);
  const { send, isSending, trouble } = useAct();
  const ask = async (event: FormEvent): Promise<void> => {
    event.preventDefault();
    setAsked(null);
    if ((await send({ path: '/api/password/forgotten', body: { email } })).ok) setAsked(email.trim());
  };
  return (
    <form onSubmit={(event) => void ask(event)} className="flex flex-col gap-4" aria-label="Forgotten password">
      <FormTrouble words={trouble} />
      {asked !== null && (
        <Notice live="polite" title="Look into your mail">
          <p>
            If {asked} belongs to an account, a letter is on its way to it. Its link works for one hour. Nothing came?
            Look among the unwanted mail, then ask your coordinator which address you were invited with.
          </p>
        </Notice>
      )}
      <Field id="email" label="E-mail" required>
        {(control) => (
          <Input
            {...control}
            type="email"
            autoComplete="username"
            maxLength={200}
            className="min-h-12"
            value={email}
            onChange={(event) => setEmail(event.target.value)}
          />
        )}
      </Field>
      <Button type="submit" tone="main" className="min-h-12" disabled={isSending}>
        {isSending ? 'Asking …' : 'Send me a link'}
      </Button>
    </form>
  );
}
