'use client';

import { type ReactElement, type ReactNode, useEffect, useRef } from 'react';

interface ScreenProps {
  title: string;
  /** One line under the title. */
  under?: ReactNode;
  /** Use the whole width of a wide page instead of one column. */
  wide?: boolean;
  children: ReactNode;
}

/** Names the document after the screen and takes the focus to its heading, as a document load would. */
function useScreenTitle(title: string) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => {
    document.title = `${title} · Undereave`;
  }, [title]);
  useEffect(() => {
    if (document.activeElement === document.body) heading.current?.focus({ preventScroll: true });
  }, []);
  return heading;
}

/** A screen of the field app: its heading, under the short roof line of the mark, and its parts below each other. */
export function Screen({ title, under, wide = false, children }: ScreenProps): ReactElement {
  const heading = useScreenTitle(title);
  return (
    <main
      className={`mx-auto flex w-full flex-col gap-6 px-gap pt-5 pb-12 ${wide ? 'max-w-[76rem]' : 'max-w-[40rem]'}`}
    >
      <div>
        <svg width="64" height="13" viewBox="0 0 64 13" aria-hidden="true" className="text-main">
          <path d="M1 11L63 2" stroke="currentColor" strokeWidth="4" />
        </svg>
        <h1
          ref={heading}
          tabIndex={-1}
          className="mt-1 text-[1.75rem] leading-tight font-bold outline-none [overflow-wrap:anywhere]"
        >
          {title}
        </h1>
        {under && <div className="mt-1 text-quiet">{under}</div>}
      </div>
      {children}
    </main>
  );
}
