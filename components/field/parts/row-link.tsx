import type { ReactElement, ReactNode } from 'react';

interface RowLinkProps {
  href: string;
  title: string;
  children?: ReactNode;
}

/** A large link to another screen: its name, and what one should know before pressing. */
export function RowLink({ href, title, children }: RowLinkProps): ReactElement {
  return (
    <a
      href={href}
      className="flex min-h-field items-center justify-between gap-4 rounded-xl border-3 border-ink bg-paper px-4 py-3 text-ink no-underline hover:bg-wash"
    >
      <span className="min-w-0 [overflow-wrap:anywhere]">
        <span className="block font-bold">{title}</span>
        {children && <span className="block text-quiet">{children}</span>}
      </span>
      <span aria-hidden="true" className="text-2xl font-bold">
        ›
      </span>
    </a>
  );
}
