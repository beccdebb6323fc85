'use client';

import type { ReactElement } from 'react';

interface SideKeyProps {
  /** Stands out: the next thing to press. */
  main?: boolean;
  onPress: () => void;
  children: string;
}

/** A small key beside the tally. */
export function SideKey({ main = false, onPress, children }: SideKeyProps): ReactElement {
  return (
    <button
      type="button"
      onClick={onPress}
      className={`min-h-field shrink-0 touch-manipulation rounded-xl border-3 px-3 font-bold select-none ${main ? 'border-main bg-main text-main-on' : 'border-ink bg-paper active:bg-main-wash'}`}
    >
      {children}
    </button>
  );
}
