'use client';

import type { ReactElement, ReactNode } from 'react';

interface ToggleKeyProps {
  pressed: boolean;
  onPress: () => void;
  /** It says nothing about a cell just now, as while painting. */
  disabled?: boolean;
  /** A small sign before the word. */
  sign?: ReactNode;
  children: string;
}

/** A mark that is on or off: dashed and white, or solid and black with a tick. */
export function ToggleKey({ pressed, onPress, disabled = false, sign, children }: ToggleKeyProps): ReactElement {
  return (
    <button
      type="button"
      aria-pressed={pressed}
      disabled={disabled}
      onClick={onPress}
      className="flex min-h-field min-w-0 touch-manipulation items-center justify-center gap-1 rounded-xl border-3 border-dashed border-ink bg-paper px-1 font-bold select-none active:bg-main-wash aria-pressed:border-solid aria-pressed:bg-ink aria-pressed:text-paper disabled:border-rule disabled:bg-paper disabled:text-quiet"
    >
      <span aria-hidden="true" className="max-[359px]:hidden">
        {pressed ? '✓' : sign}
      </span>
      {children}
    </button>
  );
}
