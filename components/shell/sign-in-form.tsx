'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';
import { Notice } from '@/components/ui/notice';
import { DemoSignIns, type DemoSignIn } from './demo-sign-ins';
import { signInTrouble } from './sign-in-words';
import { useSignIn } from './use-sign-in';

interface SignInFormProps {
  /** A path of this site to open afterwards. */
  next: string;
  demo: readonly DemoSignIn[];
}

/** E-mail and password; afterwards a full document load, so that the phone app starts under its own worker. */
export function SignInForm({ next, demo }: SignInFormProps): ReactElement {
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const { submit, isSending, result } = useSignIn(next);
  const send = (event: FormEvent): void => {
    event.preventDefault();
    void submit({ email: email.trim(), password });
  };
  const take = (person: DemoSignIn): void => {
    setEmail(person.email);
    setPassword(person.password);
  };
  const trouble = signInTrouble(result);
  return (
    <>
      <form onSubmit={send} className="flex flex-col gap-4" aria-label="Sign in">
        {trouble && (
          <Notice tone="stop" live="assertive">
            <p>{trouble}</p>
          </Notice>
        )}
        <Field id="email" label="E-mail" required>
          {(control) => (
            <Input
              {...control}
              type="email"
              autoComplete="username"
              maxLength={320}
              className="min-h-12"
              value={email}
              onChange={(event) => setEmail(event.target.value)}
            />
          )}
        </Field>
        <Field id="password" label="Password" required>
          {(control) => (
            <Input
              {...control}
              type="password"
              autoComplete="current-password"
              maxLength={1024}
              className="min-h-12"
              value={password}
              onChange={(event) => setPassword(event.target.value)}
            />
          )}
        </Field>
        <Button type="submit" tone="main" className="min-h-12" disabled={isSending}>
          {isSending ? 'Signing in …' : 'Sign in'}
        </Button>
      </form>
      <p className="mt-4">
        <a href="/reset" className="inline-flex min-h-9 items-center text-main underline underline-offset-4">
          Forgotten your password?
        </a>
      </p>
      <DemoSignIns people={demo} onTake={take} />
    </>
  );
}
