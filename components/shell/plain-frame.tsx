import type { ReactElement, ReactNode } from 'react';
import { CautionsLine } from './cautions-line';
import { Mark } from './mark';

/** A page without navigation: the mark, one column, the cautions. */
export function PlainFrame({ children }: { children: ReactNode }): ReactElement {
  return (
    <div className="flex min-h-dvh flex-col">
      <main className="mx-auto w-full max-w-[27rem] grow px-5 pt-10 sm:pt-16">
        <p className="mb-8 flex items-center gap-4 text-3xl font-bold">
          <Mark size={64} />
          Undereave
        </p>
        {children}
      </main>
      <CautionsLine />
    </div>
  );
}
