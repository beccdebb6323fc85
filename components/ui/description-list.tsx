import type { ReactElement, ReactNode } from 'react';

/** One term and what is said about it. */
export interface Described {
  term: string;
  children: ReactNode;
}

/** Terms at the left, what they are at the right; below each other on a narrow page. */
export function DescriptionList({ items }: { items: readonly Described[] }): ReactElement {
  return (
    <dl className="flex flex-col gap-2">
      {items.map(({ term, children }) => (
        <div key={term} className="keep-together sm:grid sm:grid-cols-[10.5rem_minmax(0,1fr)] sm:gap-x-3">
          <dt className="text-quiet">{term}</dt>
          <dd className="[overflow-wrap:anywhere]">{children}</dd>
        </div>
      ))}
    </dl>
  );
}
