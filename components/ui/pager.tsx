import Link from 'next/link';
import type { ReactElement } from 'react';
import { buttonLook } from './button-look';

interface PagerProps {
  page: number;
  pages: number;
  /** What the pages hold, such as `12 nests`. */
  summary: string;
  hrefOf: (page: number) => string;
}

/** Steps through the pages of a list. One page shows only the count. */
export function Pager({ page, pages, summary, hrefOf }: PagerProps): ReactElement {
  return (
    <nav aria-label="Pages" className="mt-4 flex flex-wrap items-center gap-3">
      {page > 1 && (
        <Link rel="prev" href={hrefOf(page - 1)} className={buttonLook('plain', 'lab')}>
          Back
        </Link>
      )}
      {page < pages && (
        <Link rel="next" href={hrefOf(page + 1)} className={buttonLook('plain', 'lab')}>
          Next
        </Link>
      )}
      <p className="text-quiet">
        {summary}
        {pages > 1 && `, page ${page} of ${pages}`}
      </p>
    </nav>
  );
}
