import type { ReactElement, ReactNode } from 'react';

interface DisclosureProps {
  summary: ReactNode;
  /** Lab pages are dense; in the field a gloved finger opens it. */
  size?: 'lab' | 'field';
  className?: string;
  children: ReactNode;
}

/** More, one tap away: the browser's own details element, so it works without script. */
export function Disclosure({ summary, size = 'lab', className = '', children }: DisclosureProps): ReactElement {
  return (
    <details className={`group ${className}`}>
      <summary
        className={`inline-flex items-center gap-2 font-bold text-main underline underline-offset-4 ${size === 'field' ? 'min-h-field min-w-field' : 'min-h-8'}`}
      >
        {summary}
      </summary>
      <div className="mt-2 border-l-2 border-rule pl-4">{children}</div>
    </details>
  );
}
