'use client';

import type { MouseEvent, ReactElement, ReactNode } from 'react';
import { innerTarget } from './link-press';
import { goTo } from './use-field-path';

/** Follows the pressed link inside the app when it leads there; leaves all others to the browser. */
function follow(event: MouseEvent): void {
  if (event.defaultPrevented || !(event.target instanceof Element)) return;
  const link = event.target.closest('a');
  if (!link?.href) return;
  const path = innerTarget({
    href: link.href,
    origin: window.location.origin,
    button: event.button,
    modified: event.metaKey || event.ctrlKey || event.shiftKey || event.altKey,
    elsewhere: link.target !== '' || link.hasAttribute('download'),
  });
  if (path === null) return;
  event.preventDefault();
  goTo(path);
}

/** Makes the plain links inside it work without loading a document. */
export function InnerLinks({ children }: { children: ReactNode }): ReactElement {
  return (
    <div className="contents" onClick={follow}>
      {children}
    </div>
  );
}
