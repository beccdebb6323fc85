'use client';

import type { ReactElement } from 'react';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';

interface TextLineProps {
  id: string;
  label: string;
  hint: string;
  value: string;
  onChange: (value: string) => void;
  maxLength: number;
  required?: boolean;
  error?: string | null;
  type?: 'text' | 'search';
}

/** One line to type, large enough for gloves, with its label and hint above. */
export function TextLine({
  id,
  label,
  hint,
  value,
  onChange,
  maxLength,
  required,
  error,
  type = 'text',
}: TextLineProps): ReactElement {
  return (
    <Field id={id} label={label} hint={<span className="text-field">{hint}</span>} required={required} error={error}>
      {(control) => (
        <Input
          {...control}
          type={type}
          value={value}
          maxLength={maxLength}
          autoComplete="off"
          onChange={(event) => onChange(event.target.value)}
          className="min-h-field max-w-[40rem] border-3 text-field"
        />
      )}
    </Field>
  );
}
