'use client';

import type { ReactElement } from 'react';

interface SwitchKeyProps {
  title: string;
  hint?: string;
  on: boolean;
  onChange: (on: boolean) => void;
}

/** One setting that is on or off, as large as a gloved finger; says which in a word. */
export function SwitchKey({ title, hint, on, onChange }: SwitchKeyProps): ReactElement {
  return (
    <button
      type="button"
      role="switch"
      aria-checked={on}
      onClick={() => onChange(!on)}
      className="flex min-h-field w-full touch-manipulation items-center justify-between gap-4 rounded-xl border-3 border-edge px-4 py-2 text-left aria-checked:border-main aria-checked:bg-main-wash"
    >
      <span>
        <span className="block font-bold">{title}</span>
        {hint && <span className="block text-quiet">{hint}</span>}
      </span>
      <span aria-hidden="true" className="shrink-0 rounded border-2 border-ink px-3 py-1 font-bold">
        {on ? 'On' : 'Off'}
      </span>
    </button>
  );
}
