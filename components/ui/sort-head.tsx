import Link from 'next/link';
import type { ReactElement, ReactNode } from 'react';
import { HeadCell } from './table';

/** How a column is sorted now: up from the smallest, down from the largest, or not at all. */
export type SortState = 'up' | 'down' | 'none';

const ARIA_SORT = { up: 'ascending', down: 'descending', none: 'none' } as const;
const SIGNS: Readonly<Record<SortState, string>> = { up: '▲', down: '▼', none: '' };

interface SortHeadProps {
  state: SortState;
  /** Where a press leads: the same list sorted by this column, or the other way round. */
  href: string;
  className?: string;
  children: ReactNode;
}

/** A column heading that sorts its list by a link: it works without script and can be bookmarked. */
export function SortHead({ state, href, className, children }: SortHeadProps): ReactElement {
  return (
    <HeadCell aria-sort={ARIA_SORT[state]} className={className}>
      <Link
        href={href}
        scroll={false}
        className="inline-flex min-h-6 items-center gap-1 whitespace-nowrap hover:underline"
      >
        {children}
        <span aria-hidden="true" className="w-3 text-xs">
          {SIGNS[state]}
        </span>
      </Link>
    </HeadCell>
  );
}
