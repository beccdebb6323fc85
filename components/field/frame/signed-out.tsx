import type { ReactElement } from 'react';
import { Notice } from '@/components/ui/notice';
import { FieldLink } from '@/components/field/parts/field-button';
import { Screen } from '@/components/field/parts/screen';
import { Mark } from '@/components/shell/mark';
import { SIGN_IN_HREF } from './sign-in-again';

/** What a phone shows that knows nobody. `reachable`: the office answered just now. */
export function SignedOut({ reachable }: { reachable: boolean }): ReactElement {
  return (
    <div className="min-h-dvh bg-paper text-field text-ink">
      <header className="flex items-center gap-2 border-b-3 border-ink px-gap py-2 text-xl font-bold">
        <Mark size={38} />
        Undereave
      </header>
      <Screen title="Sign in to begin">
        <p>
          The first sign-in on a phone needs signal. After that the app opens without it, and what you record is kept on
          the phone until the office has it.
        </p>
        {!reachable && (
          <Notice tone="warn" title="No signal to the office just now">
            <p>Go where there is signal, sign in once, then go to the nest.</p>
          </Notice>
        )}
        <FieldLink tone="main" href={SIGN_IN_HREF}>
          Sign in
        </FieldLink>
      </Screen>
    </div>
  );
}
