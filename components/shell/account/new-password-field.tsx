'use client';

import { type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';

interface NewPasswordFieldProps {
  value: string;
  onChange: (value: string) => void;
  error?: string | null;
  label?: string;
}

/** Shortest new password, in signs as a person counts them; the office decides. */
const SHORTEST = 15;

/** What to say about a new password before it is sent; null when it may go. */
export function passwordTrouble(password: string): string | null {
  const missing = SHORTEST - [...password].length;
  return missing > 0 ? `A password has at least ${SHORTEST} signs; ${missing} more.` : null;
}

/** A new password: seen on request instead of typed twice, and open to paste and password managers. */
export function NewPasswordField({
  value,
  onChange,
  error,
  label = 'New password',
}: NewPasswordFieldProps): ReactElement {
  const [isShown, setShown] = useState(false);
  return (
    <Field
      id="new-password"
      label={label}
      required
      error={error}
      hint="At least 15 signs; four or five words of your own do well. Pasting and password managers are welcome."
    >
      {(control) => (
        <div className="flex gap-2">
          <Input
            {...control}
            type={isShown ? 'text' : 'password'}
            autoComplete="new-password"
            autoCapitalize="none"
            spellCheck={false}
            maxLength={1024}
            className="min-h-12"
            value={value}
            onChange={(event) => onChange(event.target.value)}
          />
          <Button aria-pressed={isShown} onClick={() => setShown(!isShown)}>
            {isShown ? 'Hide' : 'Show'}
          </Button>
        </div>
      )}
    </Field>
  );
}
