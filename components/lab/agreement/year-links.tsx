import Link from 'next/link';
import type { ReactElement } from 'react';

/** The other seasons there are figures for. */
export function YearLinks({ years, shown }: { years: readonly string[]; shown: string }): ReactElement | null {
  if (years.length < 2) return null;
  return (
    <nav aria-label="Seasons" className="print-hidden mb-5 flex flex-wrap gap-x-5">
      {years.map((year) => (
        <Link
          key={year}
          href={`/agreement?year=${year}`}
          aria-current={year === shown ? 'page' : undefined}
          className="inline-flex min-h-8 items-center underline-offset-4 aria-[current=page]:font-bold not-aria-[current=page]:text-main not-aria-[current=page]:underline"
        >
          {year}
        </Link>
      ))}
    </nav>
  );
}
