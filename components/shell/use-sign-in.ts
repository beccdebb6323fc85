import { useState } from 'react';
import { type Credentials, requestSignIn, type SignInResult } from './sign-in-request';

interface SignInHandle {
  submit: (credentials: Credentials) => Promise<void>;
  isSending: boolean;
  /** What came of the last try that failed; null before one and while one is under way. */
  result: SignInResult | null;
}

/** Signs in and loads the page to go to; stays on the form with the reason when that fails. */
export function useSignIn(next: string): SignInHandle {
  const [isSending, setSending] = useState(false);
  const [result, setResult] = useState<SignInResult | null>(null);
  const submit = async (credentials: Credentials): Promise<void> => {
    setSending(true);
    setResult(null);
    const outcome = await requestSignIn(credentials, fetch);
    if (outcome.kind === 'in') return window.location.assign(next);
    setResult(outcome);
    setSending(false);
  };
  return { submit, isSending, result };
}
