import type { ReactElement, ReactNode } from 'react';
import { LinkButton } from '@/components/ui/link-button';

interface ClosedLinkProps {
  title: string;
  children: ReactNode;
  way: { href: string; words: string };
}

/** A link that does not work, for whatever reason: all look alike, and all get a way on. */
export function ClosedLink({ title, children, way }: ClosedLinkProps): ReactElement {
  return (
    <>
      <h1 className="text-2xl font-bold">{title}</h1>
      <p className="mt-3">{children}</p>
      <LinkButton href={way.href} className="mt-5 min-h-12">
        {way.words}
      </LinkButton>
    </>
  );
}
