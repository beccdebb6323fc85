'use client';

import { usePathname } from 'next/navigation';
import { useSyncExternalStore } from 'react';

const never = (): (() => void) => () => undefined;

/** False while the prerendered shell is being taken over, true from then on. */
function useMounted(): boolean {
  return useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
}

/**
 * The current path, or null until the page has taken over the prerendered shell: that shell is one document for
 * every inner path, so it may not guess which one was asked for.
 */
export function useFieldPath(): string | null {
  const path = usePathname();
  return useMounted() ? path : null;
}

/** Shows another inner path, as a new step in the browser's history. */
export function goTo(path: string): void {
  window.history.pushState(null, '', path);
  window.scrollTo(0, 0);
}

/** Shows another inner path in place of the current step: Back does not return to the present one. */
export function goInstead(path: string): void {
  window.history.replaceState(null, '', path);
  window.scrollTo(0, 0);
}
