import type { ReactElement } from 'react';

/** What a screen shows while the phone's own records are opened: still, and for a moment only. */
export function Fetching({ what }: { what: string }): ReactElement {
  return (
    <main aria-busy="true" className="mx-auto w-full max-w-[40rem] px-gap pt-8">
      <p role="status" className="text-quiet">
        {what}: opening …
      </p>
    </main>
  );
}
