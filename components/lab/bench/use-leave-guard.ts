import { useEffect } from 'react';

/** Asks before the page is closed or reloaded while there is work on it that is stored nowhere. */
export function useLeaveGuard(hasUnsaved: boolean): void {
  useEffect(() => {
    if (!hasUnsaved) return;
    const ask = (event: BeforeUnloadEvent): void => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [hasUnsaved]);
}
