import type { ReactElement, ReactNode } from 'react';

interface EmptyStateProps {
  title: string;
  children?: ReactNode;
}

/** What a list says when it holds nothing: why, and what to do next. */
export function EmptyState({ title, children }: EmptyStateProps): ReactElement {
  return (
    <div className="flex items-start gap-4 border-y border-rule py-8">
      <svg width="40" height="46" viewBox="0 0 48 52" aria-hidden="true" className="shrink-0 text-edge">
        <polygon
          points="24,2 45,14 45,38 24,50 3,38 3,14"
          fill="none"
          stroke="currentColor"
          strokeWidth="2.5"
          strokeDasharray="5 4"
        />
      </svg>
      <div className="max-w-text">
        <p className="text-lg font-bold">{title}</p>
        <div className="mt-1 text-quiet">{children}</div>
      </div>
    </div>
  );
}
