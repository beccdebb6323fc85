'use client';

import { useEffect } from 'react';

/** Can this browser keep the screen awake? */
export function canKeepAwake(): boolean {
  return typeof navigator !== 'undefined' && 'wakeLock' in navigator;
}

/**
 * Keeps the screen awake while mounted. The browser drops the lock whenever the page is hidden, so it is asked for
 * again on return. A refusal (low battery) is no error: the screen then sleeps as it always does.
 */
export function useWakeLock(): void {
  useEffect(() => {
    if (!canKeepAwake()) return;
    let lock: WakeLockSentinel | null = null;
    let over = false;
    const ask = async (): Promise<void> => {
      if (document.visibilityState !== 'visible') return;
      const granted = await navigator.wakeLock.request('screen').catch(() => null);
      if (over) await granted?.release();
      else lock = granted;
    };
    const onReturn = (): void => void ask();
    onReturn();
    document.addEventListener('visibilitychange', onReturn);
    return () => {
      over = true;
      document.removeEventListener('visibilitychange', onReturn);
      void lock?.release();
    };
  }, []);
}
