import type { ReactElement } from 'react';

/** A nest's code as it stands on its label: boxed, in the mono face. */
export function NestCode({ children }: { children: string }): ReactElement {
  return (
    <span className="inline-block rounded-xs border-2 border-ink px-1.5 font-mono text-[0.95em] leading-snug font-bold whitespace-nowrap">
      {children}
    </span>
  );
}
