import type { ReactElement, ReactNode } from 'react';

interface DisclosureProps {
  summary: ReactNode;
  className?: string;
  children: ReactNode;
}

/** More, one tap away: the browser's own details element, so it works without script. */
export function Disclosure({ summary, className = '', children }: DisclosureProps): ReactElement {
  return (
    <details className={`group ${className}`}>
      <summary className="inline-flex min-h-8 items-center gap-2 font-bold text-main underline underline-offset-4">
        {summary}
      </summary>
      <div className="mt-2 border-l-2 border-rule pl-4">{children}</div>
    </details>
  );
}
