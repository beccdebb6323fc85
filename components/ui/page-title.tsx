import type { ReactElement, ReactNode } from 'react';

interface PageTitleProps {
  children: ReactNode;
  /** One quiet line under the title. */
  under?: ReactNode;
  /** The main act of the page. */
  act?: ReactNode;
}

/** The title of a page, under a short slanted line like the roof edge of the mark. */
export function PageTitle({ children, under, act }: PageTitleProps): ReactElement {
  return (
    <div className="mb-5 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <div className="min-w-0">
        <svg width="56" height="12" viewBox="0 0 56 12" aria-hidden="true" className="print-hidden text-main">
          <path d="M1 10L55 2" stroke="currentColor" strokeWidth="3.5" />
        </svg>
        <h1 className="mt-1 text-2xl leading-tight font-bold [overflow-wrap:anywhere]">{children}</h1>
        {under && <p className="mt-1 text-quiet">{under}</p>}
      </div>
      {act}
    </div>
  );
}
