import type { ReactElement } from 'react';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { Screen } from '@/components/field/parts/screen';
import { RoofMark } from './roof-mark';
import { SIGN_IN_HREF } from './sign-in-again';

/** What a phone shows that knows nobody. `reachable`: the office answered just now. */
export function SignedOut({ reachable }: { reachable: boolean }): ReactElement {
  return (
    <div className="min-h-dvh bg-paper text-field text-ink">
      <header className="flex items-center gap-2 border-b-3 border-ink px-gap py-2 text-xl font-bold">
        <RoofMark />
        Undereave
      </header>
      <Screen title="Sign in to begin">
        <p>
          The first sign-in on a phone needs signal. After that the app opens without it, and what you record is kept on the phone
          until the office has it.
        </p>
        {!reachable && (
          <Notice tone="warn" title="No signal to the office just now">
            <p>Go where there is signal, sign in once, then go to the nest.</p>
          </Notice>
        )}
        <LinkButton tone="main" size="field" href={SIGN_IN_HREF}>
          Sign in
        </LinkButton>
      </Screen>
    </div>
  );
}
