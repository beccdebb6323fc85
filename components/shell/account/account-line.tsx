import type { ReactElement } from 'react';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';

/** The account a password is for. A control, because password managers file what they keep under it. */
export function AccountLine({ email }: { email: string }): ReactElement {
  return (
    <Field id="account-email" label="E-mail">
      {(control) => (
        <Input {...control} type="email" autoComplete="username" readOnly value={email} className="min-h-12 bg-wash" />
      )}
    </Field>
  );
}
