'use client';

import { useEffect, useEffectEvent } from 'react';
import { type Desk, runCommand } from './desk';
import { commandOfKey } from './key-map';

/** Is the person typing, or is a panel open over the comb? Then letters are not marks. */
function isElsewhere(target: EventTarget | null): boolean {
  return target instanceof Element && target.closest('input, textarea, select, dialog') !== null;
}

/** The keyboard of the recorder works wherever the focus is, except in text fields and panels. */
export function useRecorderKeys(desk: Desk): void {
  const onKey = useEffectEvent((event: KeyboardEvent) => {
    if (event.defaultPrevented || isElsewhere(event.target)) return;
    const command = commandOfKey(event);
    if (!command) return;
    event.preventDefault();
    // A key held down walks on, but never marks cell after cell.
    if (event.repeat && command.do !== 'step') return;
    runCommand(desk, command);
  });
  useEffect(() => {
    const listener = (event: KeyboardEvent): void => onKey(event);
    document.addEventListener('keydown', listener);
    return () => document.removeEventListener('keydown', listener);
  }, []);
}
