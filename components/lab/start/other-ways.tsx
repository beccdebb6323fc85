import Link from 'next/link';
import type { ReactElement } from 'react';

const WAYS = [
  { href: '/tour', title: 'Walk through a season', words: 'Every part of the product, in the order of the work.' },
  { href: '/limits', title: 'What is not known', words: 'Cautions, and how far each number can be trusted.' },
] as const;

/** Two more pages for whoever is new here. */
export function OtherWays(): ReactElement {
  return (
    <ul className="mt-8 grid max-w-[46rem] gap-4 sm:grid-cols-2">
      {WAYS.map(({ href, title, words }) => (
        <li key={href} className="border-l-[6px] border-main py-1 pl-4">
          <Link
            href={href}
            className="inline-flex min-h-8 items-center font-bold text-main underline underline-offset-4"
          >
            {title}
          </Link>
          <p className="text-quiet">{words}</p>
        </li>
      ))}
    </ul>
  );
}
