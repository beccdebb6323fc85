import type { ReactElement } from 'react';

/** The first stop of the keyboard: past the header to the page itself. */
export function SkipLink(): ReactElement {
  return (
    <a
      href="#main"
      className="sr-only focus:not-sr-only focus:absolute focus:z-10 focus:m-2 focus:rounded focus:bg-main focus:px-4 focus:py-2 focus:font-bold focus:text-main-on"
    >
      Skip to the page
    </a>
  );
}
