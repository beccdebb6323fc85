'use client';

import { type ReactElement, useId } from 'react';

/** One of several things to choose. */
export interface Choice<T extends string> {
  value: T;
  title: string;
  hint?: string;
}

interface ChoicesProps<T extends string> {
  legend: string;
  choices: readonly Choice<T>[];
  value: T;
  onChange: (value: T) => void;
  /** Beside each other in three columns, for short titles. */
  inline?: boolean;
}

const LOOK =
  'flex min-h-field items-center rounded-xl border-3 border-edge py-2 has-checked:border-main has-checked:bg-main-wash ' +
  'has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-main';

/** One of a few, each as large as a gloved finger; the chosen one bears a mark and a thick edge, not colour alone. */
export function Choices<T extends string>({
  legend,
  choices,
  value,
  onChange,
  inline = false,
}: ChoicesProps<T>): ReactElement {
  const name = useId();
  return (
    <fieldset className={`grid gap-gap ${inline ? 'grid-cols-3' : ''}`}>
      <legend className="mb-2 font-bold">{legend}</legend>
      {choices.map((choice) => (
        <label
          key={choice.value}
          className={`${LOOK} ${inline ? 'justify-center gap-2 px-1 leading-tight' : 'gap-4 px-4'}`}
        >
          <input
            type="radio"
            name={name}
            value={choice.value}
            checked={choice.value === value}
            onChange={() => onChange(choice.value)}
            className="size-6 shrink-0 accent-main outline-none"
          />
          <span>
            <span className="block font-bold">{choice.title}</span>
            {choice.hint && <span className="block text-quiet">{choice.hint}</span>}
          </span>
        </label>
      ))}
    </fieldset>
  );
}
