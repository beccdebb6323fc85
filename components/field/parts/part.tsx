import { type ReactElement, type ReactNode, useId } from 'react';

interface PartProps {
  title: string;
  children: ReactNode;
}

/** A titled part of a screen. */
export function Part({ title, children }: PartProps): ReactElement {
  const heading = useId();
  return (
    <section aria-labelledby={heading} className="flex flex-col gap-gap">
      <h2 id={heading} className="border-b-2 border-ink pb-1 text-xl font-bold">
        {title}
      </h2>
      {children}
    </section>
  );
}
