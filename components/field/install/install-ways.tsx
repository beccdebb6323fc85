'use client';

import { type ReactElement, useSyncExternalStore } from 'react';
import { FieldButton } from '@/components/field/parts/field-button';
import { type InstallState, installSignal, promptInstall } from './install-state';

/** How the app can come to the home screen of this phone; `menu` while the page is prerendered. */
export function useInstallState(): InstallState {
  return useSyncExternalStore(
    (listener) => installSignal().subscribe(listener),
    () => installSignal().get(),
    () => 'menu',
  );
}

/** The steps in Safari, which offers no key for it. */
function SafariSteps(): ReactElement {
  return (
    <>
      <ol className="ml-6 list-decimal">
        <li>Press the Share key of Safari: a square with an arrow up.</li>
        <li>
          Choose <strong>Add to Home Screen</strong>, then <strong>Add</strong>.
        </li>
        <li>Open Undereave from the home screen and sign in there once, with signal.</li>
      </ol>
      <p className="mt-2">
        Send what is unsent before: Safari and the home screen do not share what they keep, and Safari may clear what a
        page keeps after seven days without a visit.
      </p>
    </>
  );
}

/** What to do to have the app on the home screen. */
export function InstallWays(): ReactElement {
  const state = useInstallState();
  if (state === 'installed') return <p>The app is on this phone’s home screen.</p>;
  if (state === 'safari') return <SafariSteps />;
  if (state === 'prompt') {
    return (
      <>
        <p>
          From the home screen it opens without signal like any other app, and the browser keeps its records longer.
        </p>
        <FieldButton className="mt-3" onClick={() => void promptInstall()}>
          Put it on the home screen
        </FieldButton>
      </>
    );
  }
  return (
    <p>
      Look in the menu of this browser for <strong>Install app</strong> or <strong>Add to Home screen</strong>. Then the
      browser keeps the records longer.
    </p>
  );
}
