'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import type { ReactElement, ReactNode } from 'react';

interface NavLinkProps {
  href: string;
  children: ReactNode;
}

/** A link of the main navigation; the part of the product one is in is underlined and said. */
export function NavLink({ href, children }: NavLinkProps): ReactElement {
  const path = usePathname();
  const isHere = path === href || path.startsWith(`${href}/`);
  return (
    <Link
      href={href}
      aria-current={isHere ? 'page' : undefined}
      className="inline-flex min-h-9 items-center border-y-[3px] border-transparent hover:border-b-edge aria-[current=page]:border-b-main aria-[current=page]:font-bold"
    >
      {children}
    </Link>
  );
}
