import type { ComponentPropsWithRef, ReactElement } from 'react';

const LOOK =
  'w-full rounded border-2 border-edge bg-paper px-3 py-1 text-ink placeholder:text-quiet ' +
  'hover:border-ink aria-invalid:border-stop disabled:bg-wash disabled:text-quiet';

/** A one-line text, date or search control; give it the attributes of its `Field`. */
export function Input({ className = '', ...rest }: ComponentPropsWithRef<'input'>): ReactElement {
  return <input className={`${LOOK} min-h-9 ${className}`} {...rest} />;
}

/** A text of several lines. */
export function TextArea({ className = '', rows = 3, ...rest }: ComponentPropsWithRef<'textarea'>): ReactElement {
  return <textarea className={`${LOOK} ${className}`} rows={rows} {...rest} />;
}
