'use client';

import type { ReactElement } from 'react';

const INSTARS = [1, 2, 3, 4, 5] as const;

interface InstarKeysProps {
  value: number | null;
  onChange: (instar: number | null) => void;
}

/** The larva's instar, for those who can tell; a second press takes it back. */
export function InstarKeys({ value, onChange }: InstarKeysProps): ReactElement {
  return (
    <fieldset>
      <legend className="mb-2 font-bold">Instar of the larva, if you can tell</legend>
      <div className="grid grid-cols-5 gap-3">
        {INSTARS.map((instar) => (
          <button
            key={instar}
            type="button"
            aria-label={`Instar ${instar}`}
            aria-pressed={value === instar}
            onClick={() => onChange(value === instar ? null : instar)}
            className="min-h-field rounded-xl border-3 border-dashed border-ink text-2xl font-bold aria-pressed:border-solid aria-pressed:bg-ink aria-pressed:text-paper"
          >
            {instar}
          </button>
        ))}
      </div>
    </fieldset>
  );
}
