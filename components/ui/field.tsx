import type { ReactElement, ReactNode } from 'react';

/** The attributes that tie a control to its label, hint and error. */
export interface FieldControl {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
  required: boolean | undefined;
}

interface FieldProps {
  id: string;
  label: string;
  hint?: ReactNode;
  /** What is wrong and how to put it right; null or nothing when all is well. */
  error?: string | null;
  required?: boolean;
  className?: string;
  /** Renders the control with the attributes it must carry. */
  children: (control: FieldControl) => ReactNode;
}

/** A label over a control, with a hint and, when needed, an error that is read out with it. */
export function Field({ id, label, hint, error, required, className = '', children }: FieldProps): ReactElement {
  const describedBy = [hint && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(' ');
  return (
    <div className={`flex flex-col gap-1 ${className}`}>
      <label htmlFor={id} className="font-bold">
        {label}
      </label>
      {hint && (
        <p id={`${id}-hint`} className="text-sm text-quiet">
          {hint}
        </p>
      )}
      {children({
        id,
        'aria-describedby': describedBy || undefined,
        'aria-invalid': error ? true : undefined,
        required,
      })}
      {error && (
        <p id={`${id}-error`} className="font-bold text-stop">
          {error}
        </p>
      )}
    </div>
  );
}
