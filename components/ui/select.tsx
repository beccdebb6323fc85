import type { ComponentPropsWithRef, ReactElement } from 'react';

/** A choice from a short list; give it the attributes of its `Field`. */
export function Select({ className = '', ...rest }: ComponentPropsWithRef<'select'>): ReactElement {
  return (
    <select
      className={`min-h-9 w-full rounded border-2 border-edge bg-paper px-3 py-1 text-ink hover:border-ink disabled:bg-wash disabled:text-quiet ${className}`}
      {...rest}
    />
  );
}
