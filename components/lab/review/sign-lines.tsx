import type { ReactElement } from 'react';

/** Lines to sign on, on paper only. */
export function SignLines(): ReactElement {
  return (
    <div className="mt-8 hidden gap-8 print:flex" aria-hidden="true">
      {['Settled by', 'Locked by', 'Date'].map((what) => (
        <p key={what} className="grow border-t border-ink pt-1">
          {what}
        </p>
      ))}
    </div>
  );
}
