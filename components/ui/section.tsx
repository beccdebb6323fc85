import type { ReactElement, ReactNode } from 'react';

interface SectionProps {
  /** Names the section for links and for its heading. */
  id: string;
  title: string;
  /** A small act or a count at the right of the heading. */
  aside?: ReactNode;
  className?: string;
  children: ReactNode;
}

/** A titled part of a page: a heading with a rule under it. */
export function Section({ id, title, aside, className = '', children }: SectionProps): ReactElement {
  return (
    <section aria-labelledby={id} className={className}>
      <div className="mb-3 flex flex-wrap items-baseline justify-between gap-x-4 border-b border-ink pb-1">
        <h2 id={id} className="text-lg font-bold">
          {title}
        </h2>
        {aside && <div className="text-sm text-quiet">{aside}</div>}
      </div>
      {children}
    </section>
  );
}
