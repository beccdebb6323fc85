'use client';

import { type ReactElement, useId } from 'react';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';
import { FieldButton } from './field-button';
import { readCount } from './read-count';

interface CountFieldProps {
  value: number | null;
  onChange: (value: number | null) => void;
}

/** How many cells the person counts on the comb: by two large keys or by typing. Blank means not counted. */
export function CountField({ value, onChange }: CountFieldProps): ReactElement {
  const id = useId();
  const step = (by: number): void => onChange(readCount(String((value ?? 0) + by)));
  return (
    <Field
      id={id}
      label="How many cells do you count?"
      hint={<span className="text-field">Can stay blank. The walk ends at this number.</span>}
    >
      {(control) => (
        <div className="flex gap-gap">
          <FieldButton aria-label="One less" onClick={() => step(-1)} className="min-w-field text-2xl">
            −
          </FieldButton>
          <Input
            {...control}
            inputMode="numeric"
            pattern="[0-9]*"
            autoComplete="off"
            value={value ?? ''}
            onChange={(event) => onChange(readCount(event.target.value))}
            className="min-h-field border-3 text-center text-number font-bold"
          />
          <FieldButton aria-label="One more" onClick={() => step(1)} className="min-w-field text-2xl">
            +
          </FieldButton>
        </div>
      )}
    </Field>
  );
}
