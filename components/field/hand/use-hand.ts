'use client';

import { useEffect, useSyncExternalStore } from 'react';
import { HAND_DEFAULTS, type HandSettings, handSignal } from './hand-settings';

/** How this phone behaves in the hand; the defaults while the page is prerendered. */
export function useHand(): HandSettings {
  return useSyncExternalStore(
    (listener) => handSignal().subscribe(listener),
    () => handSignal().get(),
    () => HAND_DEFAULTS,
  );
}

/** The colour of the bar above the page: that of the page's ground. */
const GROUND = { low: '#000301', day: '#ffffff' } as const;

/** Puts lamp and hand on the document while the field app is open, for the style sheet to see. */
export function useHandOnDocument(): void {
  const { lamp, left } = useHand();
  useEffect(() => {
    const { dataset } = document.documentElement;
    if (lamp) dataset.lamp = 'low';
    else delete dataset.lamp;
    if (left) dataset.hand = 'left';
    else delete dataset.hand;
    document.querySelector('meta[name="theme-color"]')?.setAttribute('content', lamp ? GROUND.low : GROUND.day);
  }, [lamp, left]);
}
